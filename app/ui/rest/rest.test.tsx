import { expect, it } from 'vitest';
import { restNextView, restView } from '../../lib/format/rest.ts';
import { markup, words } from '#tests/helpers/markup.tsx';
import { RestClock } from './rest-clock.tsx';
import { RestNext } from './rest-next.tsx';
import { graduations, RestRule } from './rest-rule.tsx';

const zone = 'Europe/London';
const startedAt = new Date('2026-04-15T08:40:00Z');
const after = (hours: number) => new Date(startedAt.getTime() + hours * 3_600_000);
const rest = {
  startedAt,
  clampsOff: after(24),
  mayBeWorked: after(24),
  mayCarryStrings: after(48),
};

it('marks each hour to 48, every sixth long', () => {
  const marks = graduations(24);
  expect(marks).toHaveLength(25);
  expect(marks.filter((mark) => mark.long).map((mark) => mark.hour)).toEqual([0, 6, 12, 18, 24]);
  expect(graduations(48)).toHaveLength(49);
});

it('marks each six hours beyond, every sixth long', () => {
  const marks = graduations(72);
  expect(marks.map((mark) => mark.hour)).toEqual([
    0, 6, 12, 18, 24, 30, 36, 42, 48, 54, 60, 66, 72,
  ]);
  expect(marks.filter((mark) => mark.long).map((mark) => mark.hour)).toEqual([0, 36, 72]);
});

it('does not mark beyond the end of a rest that is no whole number of hours', () => {
  expect(graduations(2.5).map((mark) => mark.hour)).toEqual([0, 1, 2]);
});

it('fills what has gone by and stops at each time', () => {
  const html = markup(<RestRule rule={restView(rest, after(4.5), zone).rule} height={30} />);
  expect(html).toContain('class="rule-elapsed" width="4.5"');
  expect(html).toContain('class="rule-stops" d="M24 0V30M48 0V30"');
  expect(html).toContain('aria-label="4 of 48 hours rested; stops at 24 and 48 hours"');
});

it('says the next time, what is left, and all three in words', () => {
  const text = words(<RestClock rest={restView(rest, after(4 + 25 / 60), zone)} />);
  expect(text).toContain('Resting. Clamps off Thu 16 April, 09:40 19 h 35 min to go');
  expect(text).toContain(
    'Clamps off Thu 09:40 May be worked Thu 09:40 May carry strings Fri 09:40',
  );
});

it('says of a passed time that it has passed, and what may be done when all have', () => {
  expect(words(<RestClock rest={restView(rest, after(25), zone)} />)).toContain(
    'Clamps off Thu 09:40, off May be worked since Thu 09:40 May carry strings Fri 09:40',
  );
  const over = <RestClock rest={restView(rest, after(50), zone)} />;
  expect(words(over)).toContain('May carry strings now');
  expect(markup(over)).toContain('rest-clock-over');
});

it('leaves out a label that would touch its neighbour', () => {
  const near = { startedAt, clampsOff: after(2), mayCarryStrings: after(48) };
  const ends = markup(<RestClock rest={restView(near, after(1), zone)} />).match(
    /class="rest-ends">(.*?)<\/p>/,
  )?.[1];
  expect(ends?.match(/<span/g)).toHaveLength(2);
});

it('shows the next time alone on the Rack', () => {
  const view = restNextView(rest, after(4 + 25 / 60), zone);
  expect(view && words(<RestNext rest={view} />)).toBe('Wed 09:40 19 h 35 min to go');
});
