import { describe, expect, it } from 'vitest';
import { restNextView, restView } from './rest.ts';

const zone = 'Europe/London';
const rest = {
  startedAt: new Date('2026-04-15T08:40:00Z'),
  clampsOff: new Date('2026-04-16T08:40:00Z'),
  mayBeWorked: new Date('2026-04-16T08:40:00Z'),
  mayCarryStrings: new Date('2026-04-17T08:40:00Z'),
};

describe('the rest clock in words', () => {
  it('names the next time and what is left', () => {
    const view = restView(rest, new Date('2026-04-15T13:05:00Z'), zone);
    expect(view.sentence).toBe('Resting. Clamps off Thu 16 April, 09:40');
    expect(view.left).toBe('19\u00a0h 35\u00a0min to go');
    expect(view.over).toBe(false);
    expect(view.rule.hours).toBe(48);
    expect(view.rule.elapsed).toBeCloseTo(4 + 25 / 60, 10);
    expect(view.rule.stops).toEqual([24, 48]);
    expect(view.rule.label).toBe('4 of 48 hours rested; stops at 24 and 48 hours');
    expect(view.ends.map((end) => end.text)).toEqual(['Wed 09:40', 'Thu 09:40', 'Fri 09:40']);
    expect(view.times.map((time) => time.state)).toEqual(['next', 'next', 'to-come']);
  });

  it('goes on to the next time when one has passed', () => {
    const view = restView(rest, new Date('2026-04-16T09:00:00Z'), zone);
    expect(view.sentence).toBe('Resting. May carry strings Fri 17 April, 09:40');
    expect(view.times.map((time) => time.state)).toEqual(['passed', 'passed', 'next']);
  });

  it('says what may be done once all have passed', () => {
    const view = restView(rest, new Date('2026-04-20T09:00:00Z'), zone);
    expect(view.sentence).toBe('May carry strings now');
    expect(view.over).toBe(true);
    expect(view.left).toBeUndefined();
    expect(view.rule.elapsed).toBe(48);
  });

  it('shows the next one only on the Rack', () => {
    const view = restNextView(rest, new Date('2026-04-15T13:05:00Z'), zone);
    expect(view).toMatchObject({
      headline: 'Clamps off Thu, 09:40',
      left: '19\u00a0h 35\u00a0min to go',
      over: false,
      from: 'Wed 09:40',
      to: 'Thu 09:40',
      rule: { hours: 24, stops: [], label: '4 of 24 hours rested' },
    });
  });

  it('says today, and the date when it is far away', () => {
    expect(restNextView(rest, new Date('2026-04-16T06:00:00Z'), zone)?.headline).toBe(
      'Clamps off today, 09:40',
    );
    const long = { ...rest, clampsOff: new Date('2026-04-25T08:40:00Z'), mayBeWorked: null };
    const only = { ...long, mayCarryStrings: null };
    expect(restNextView(only, rest.startedAt, zone)?.headline).toBe(
      'Clamps off Sat 25 April, 09:40',
    );
  });

  it('is over, or nothing at all', () => {
    const done = restNextView(
      { ...rest, mayCarryStrings: null },
      new Date('2026-04-18T08:40:00Z'),
      zone,
    );
    expect(done).toMatchObject({ over: true, left: 'since Thu 09:40' });
    expect(restNextView({ startedAt: rest.startedAt }, rest.startedAt, zone)).toBeNull();
  });

  it('never counts backwards before the start', () => {
    const early = restView(rest, new Date('2026-04-15T00:00:00Z'), zone);
    expect(early.rule.elapsed).toBe(0);
  });
});
