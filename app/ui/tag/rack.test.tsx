import { expect, it } from 'vitest';
import { markup, words } from '#tests/helpers/markup.tsx';
import type { RackTagView, RailView } from '../types.ts';
import { Rack } from './rack.tsx';
import { Tag } from './tag.tsx';

function tag(number: string, changes: Partial<RackTagView> = {}): RackTagView {
  return {
    href: `/bench/cases/2026-${number}`,
    year: '2026',
    number,
    instrument: 'Parlour guitar',
    maker: 'Aldous Pike',
    owner: 'Marguerite Osei',
    waitsFor: 'Next: string to pitch',
    tone: 'plain',
    promised: 'Promised Fri 24 April',
    name: `Case ${number}, parlour guitar, Aldous Pike, on the bench`,
    ...changes,
  };
}

const rails = (bench: RackTagView[]): RailView[] => [
  { rail: 'bench', tags: bench },
  { rail: 'resting', tags: [] },
  { rail: 'owner', tags: [] },
  { rail: 'home', tags: [tag('025', { tone: 'sealed', waitsFor: 'Closed Fri 10 Apr by Ines' })] },
];

it('makes the whole tag one link with a name of its own', () => {
  const html = markup(<Rack sub="" rails={rails([tag('031')])} />);
  expect(html).toContain(
    'aria-label="Case 031, parlour guitar, Aldous Pike, on the bench" href="/bench/cases/2026-031"',
  );
  expect(html.match(/<a /g)).toHaveLength(2);
});

it('keeps the line of an empty rail and says that nothing hangs on it', () => {
  const text = words(<Rack sub="" rails={rails([])} />);
  expect(text).toContain('Nothing is on the bench.');
  expect(text).toContain('Nothing rests.');
  expect(text).toContain('Nothing waits for an owner.');
  expect(markup(<Rack sub="" rails={rails([])} />).match(/rail-line/g)).toHaveLength(4);
});

it('writes lines when more than fifteen would hang', () => {
  const many = (count: number) => Array.from({ length: count }, (_, i) => tag(String(100 + i)));
  expect(markup(<Rack sub="" rails={rails(many(15))} />)).not.toContain('rack-rows');
  const html = markup(<Rack sub="" rails={rails(many(16))} />);
  expect(html).toContain('rack-rows');
  expect(html).toContain('100');
});

it('marks only what is closed', () => {
  const html = markup(
    <Rack sub="" rails={rails([tag('031', { photo: { src: '/x', width: 1, height: 1 } })])} />,
  );
  expect(html.match(/wm-aligned/g)).toHaveLength(1);
});

it('prints the tag of a case with its rows', () => {
  const text = words(
    <Tag
      tag={{
        year: '2026',
        number: '031',
        instrument: 'Parlour guitar',
        maker: 'Aldous Pike',
        serial: '0417',
        owner: 'Marguerite Osei',
        takenIn: 'Mon 30 March',
        promised: 'Fri 24 April',
        complaint: 'Lifted bridge',
      }}
    />,
  );
  expect(text).toBe(
    '2026 031 Instrument Parlour guitar Aldous Pike Serial 0417 Owner Marguerite Osei Taken in Mon 30 March Promised Fri 24 April For Lifted bridge',
  );
});
