import { expect, it } from 'vitest';
import { markup, words } from '#tests/helpers/markup.tsx';
import type { GoingUpView } from '../types.ts';
import { goingUpSentence, ProgressList } from './progress-list.tsx';

const photo = (state: GoingUpView['state'], changes: Partial<GoingUpView> = {}): GoingUpView => ({
  id: state,
  name: `Photo ${state}`,
  percent: 62.4,
  state,
  ...changes,
});

it.each([
  ['up', 'Up'],
  ['going-up', '62 %'],
  ['kept', 'No signal, kept'],
  ['waiting', 'Waiting'],
] as const)('says of a photo that is %s: %s', (state, text) => {
  expect(words(<ProgressList photos={[photo(state)]} />)).toContain(text);
});

it('gives the aligned mark to what is up and to nothing else', () => {
  const all = (['up', 'going-up', 'kept', 'waiting', 'failed'] as const).map((s) => photo(s));
  expect(markup(<ProgressList photos={all} />).match(/wm-aligned/g)).toHaveLength(1);
});

it('says why one did not go up, and offers to try again unless it never can', () => {
  const reason = 'This file is cut short. Take it again.';
  const html = markup(<ProgressList photos={[photo('failed', { reason })]} onRetry={() => {}} />);
  expect(html).toContain(reason);
  expect(html).toContain('Try again');
  const refused = photo('failed', { reason, final: true });
  expect(markup(<ProgressList photos={[refused]} onRetry={() => {}} />)).not.toContain('Try again');
});

it('reads out only what is finished or failed', () => {
  const live = (photos: GoingUpView[]) =>
    markup(<ProgressList photos={photos} />).match(/aria-live="polite">(.*?)<\/p>/)?.[1];
  expect(live([photo('going-up')])).toBe('');
  expect(live([photo('up'), photo('failed')])).toBe('Up: Photo up. Did not go up: Photo failed.');
});

it('counts what is up, and where the rest is safe', () => {
  expect(goingUpSentence([photo('up'), photo('kept'), photo('going-up')])).toBe(
    '1 of 3 up. Keep this page open until then.',
  );
  expect(goingUpSentence([photo('up'), photo('up')])).toBe('All 2 are up.');
  const refused = photo('failed', { final: true });
  expect(goingUpSentence([photo('up'), photo('waiting'), refused])).toBe(
    '1 of 2 up. Keep this page open until then.',
  );
  expect(goingUpSentence([photo('up'), refused])).toBe('1 up, 1 did not go up.');
});
