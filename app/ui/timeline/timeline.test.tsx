import { expect, it } from 'vitest';
import { markup, words } from '#tests/helpers/markup.tsx';
import type { PhaseView, TimelineEntryView } from '../types.ts';
import { SealLine } from './seal-line.tsx';
import { Stations } from './stations.tsx';
import { Timeline } from './timeline.tsx';

function entry(changes: Partial<TimelineEntryView> = {}): TimelineEntryView {
  return {
    id: 'one',
    phase: 'before',
    title: 'Damage looked over',
    text: 'A slip of paper goes in.\n\nThe crack goes right through.',
    when: { iso: '2026-03-31T08:25:00.000Z', date: 'Tue 31 Mar', time: '09:25' },
    photos: [],
    facts: [],
    used: [],
    seal: { state: 'sealed', when: '09:58', by: 'Tomasz Rell', shortHash: '40ad e8a3' },
    ...changes,
  };
}

const phases = (own: TimelineEntryView[]): PhaseView[] => [
  { phase: 'before', sub: 'How it came in.', entries: own },
  { phase: 'during', sub: '', entries: [] },
  { phase: 'after', sub: 'Nothing here yet.', entries: [], empty: 'The first photo opens it.' },
];

it('has phases as h2 and entries as articles of an ordered list with h3', () => {
  const html = markup(<Timeline phases={phases([entry()])} />);
  expect(html.match(/<h2/g)).toHaveLength(3);
  expect(html).toMatch(/<ol><li><article class="entry" id="entry-one">/);
  expect(html).toContain('<h3>Damage looked over</h3>');
  expect(html).toContain('<time dateTime="2026-03-31T08:25:00.000Z">');
  expect(html.match(/class="note"/g)).toHaveLength(2);
});

it('closes the joint from two lines to one', () => {
  const html = markup(<Timeline phases={phases([entry()])} />);
  for (const phase of ['phase-before', 'phase-during', 'phase-after'])
    expect(html).toContain(`phase ${phase}`);
  expect(html.match(/class="taper"/g)).toHaveLength(2);
});

it.each([
  [
    { state: 'sealed', when: '09:58', by: 'Tomasz Rell', shortHash: '40ad e8a3' } as const,
    'aligned',
    'Sealed 09:58 by Tomasz Rell 40ad e8a3',
  ],
  [
    { state: 'sealed', when: '17:48', act: 'on the owner’s authorisation' } as const,
    'aligned',
    'Sealed 17:48 on the owner’s authorisation',
  ],
  [{ state: 'open', sentence: 'Not yet sealed.' } as const, 'hollow', 'Not yet sealed.'],
  [
    { state: 'altered', sentence: 'Does not match its seal.' } as const,
    'displaced',
    'Does not match its seal.',
  ],
])('says in words what the mark repeats: %o', (seal, state, text) => {
  expect(markup(<SealLine seal={seal} />)).toContain(`wm-${state}`);
  expect(words(<SealLine seal={seal} />)).toBe(text);
  const html = markup(<Timeline phases={phases([entry({ seal })])} />);
  expect(html).toContain(`tick-${state}`);
});

it('says what is for the bench only, what it corrects, and what a clock did not say', () => {
  const text = words(
    <Timeline
      phases={phases([
        entry({
          benchOnly: true,
          corrects: { id: 'zero', title: 'Taken in at the counter' },
          when: { ...entry().when, caution: 'time zone unknown' },
        }),
      ])}
    />,
  );
  expect(text).toContain('Bench only');
  expect(text).toContain('Corrects Taken in at the counter');
  expect(text).toContain('time zone unknown');
});

it('prints worked-out values in italic, measured ones upright, units bound', () => {
  const html = markup(
    <Timeline
      phases={phases([
        entry({
          facts: [
            { label: 'Lift', value: '0.6', unit: 'mm', kind: 'measured' },
            { label: 'Pull', value: '660', unit: 'N', kind: 'worked-out' },
          ],
        }),
      ])}
    />,
  );
  expect(html).toContain('<dd class="">0.6\u00a0<small>mm</small></dd>');
  expect(html).toContain('<dd class="italic">660\u00a0<small>N</small></dd>');
});

it('keeps markup in a note as text', () => {
  const html = markup(<Timeline phases={phases([entry({ text: '<script>alert(1)</script>' })])} />);
  expect(html).not.toContain('<script>');
});

it('gives staff their actions for each entry, and says what fills an empty phase', () => {
  const text = words(<Timeline phases={phases([entry()])} actions={(e) => <i>Edit {e.id}</i>} />);
  expect(text).toContain('Edit one');
  expect(text).toContain('The first photo opens it.');
});

it('tells where an instrument has been, is, and will be', () => {
  const html = markup(
    <Stations
      stations={[
        { label: 'Taken in', when: '30 March', state: 'done' },
        { label: 'Resting now', when: 'until Thu 09:40', state: 'here' },
        { label: 'Ready to go home', when: '24 April', state: 'to-come' },
      ]}
    />,
  );
  expect(html.match(/tick-aligned/g)).toHaveLength(1);
  expect(html.match(/tick-hollow/g)).toHaveLength(2);
  expect(html).toContain('class="station-here" aria-current="step"');
});
