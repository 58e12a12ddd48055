import { expect, it } from 'vitest';
import { markup, words } from '#tests/helpers/markup.tsx';
import type { CheckRowView } from '../types.ts';
import { CheckRows } from './check-rows.tsx';
import { Standing } from './standing.tsx';
import { Verdict } from './verdict.tsx';
import { VerifyPage } from './verify-page.tsx';

it.each([
  ['intact', 'Intact', true],
  ['does-not-match', 'Does not match', true],
  ['not-known', 'Not known', false],
  ['not-fully-checked', 'Not fully checked', false],
] as const)('says %s in words; only an answer is filled', (kind, word, filled) => {
  const html = markup(<Verdict kind={kind} sentence="Because." />);
  expect(words(<Verdict kind={kind} sentence="Because." />)).toBe(`Verdict ${word} Because.`);
  expect(html.includes('fill="currentColor"')).toBe(filled);
  expect(html.includes('fill="none"')).toBe(!filled);
});

it('keeps the standing off the mark, and withdrawn as large as intact', () => {
  const html = markup(
    <Standing standing={{ word: 'Withdrawn', date: 'On 3 May 2027.', small: 'Signed.' }} />,
  );
  expect(html).not.toMatch(/wm-|tick-|class="half/);
  expect(html).toContain('standing-off');
  expect(html).toContain('Standing, the shop’s word');
  expect(
    markup(<Standing standing={{ word: 'In force', date: 'To 2028.', small: '' }} />),
  ).not.toContain('standing-off');
});

it('says of each row what was done, and drops only what failed', () => {
  const rows: CheckRowView[] = [
    { held: 'Warranty number', heldNote: 'K7QM-3RXT-V2', result: 'good', word: 'Known' },
    {
      held: 'PDF you dropped',
      heldCode: 'b80c 11f4',
      result: 'bad',
      word: 'Does not match',
      note: 'sealed as',
      noteCode: 'c71f 0a3e',
    },
    { held: 'Photos', heldNote: '31', result: 'open', word: 'Not downloaded' },
  ];
  const html = markup(<CheckRows rows={rows} />);
  expect(html.match(/check-bad/g)).toHaveLength(1);
  expect(html.match(/tick-displaced/g)).toHaveLength(1);
  expect(html.match(/tick-aligned/g)).toHaveLength(1);
  expect(html.match(/tick-hollow/g)).toHaveLength(1);
  expect(words(<CheckRows rows={rows} />)).toBe(
    'What you hold What was checked here Warranty number K7QM-3RXT-V2 Known PDF you dropped b80c 11f4 Does not match sealed as c71f 0a3e Photos 31 Not downloaded',
  );
});

it('reads the verdict out when it comes', () => {
  const html = markup(<VerifyPage kind="not-known">x</VerifyPage>);
  expect(html).toContain('<main aria-live="polite">');
  expect(html).toContain('Verdict: Not known</h1>');
});
