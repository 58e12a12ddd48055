import { describe, expect, it } from 'vitest';
import { restFacts, restHoldsUntil, restTimes } from './rest-times.ts';

describe('a rest', () => {
  const start = new Date('2026-04-15T08:40:00.000Z');

  it('has the times that were given, in their order', () => {
    const rest = restFacts(start, { clampsOffHours: '24', workedHours: '24', stringsHours: '48' });
    expect(restTimes(rest)).toEqual([
      { name: 'clamps off', at: new Date('2026-04-16T08:40:00.000Z') },
      { name: 'may be worked', at: new Date('2026-04-16T08:40:00.000Z') },
      { name: 'may carry strings', at: new Date('2026-04-17T08:40:00.000Z') },
    ]);
  });

  it('takes part hours, and leaves out what is not used', () => {
    const rest = restFacts(start, { clampsOffHours: '0.5', workedHours: null, stringsHours: null });
    expect(restTimes(rest)).toEqual([
      { name: 'clamps off', at: new Date('2026-04-15T09:10:00.000Z') },
    ]);
  });

  it('counts elapsed hours over a clock change', () => {
    // 29 March 2026, 01:00 UTC: clocks in London go from 01:00 to 02:00.
    const rest = restFacts(new Date('2026-03-28T20:00:00Z'), {
      clampsOffHours: '12',
      workedHours: null,
      stringsHours: null,
    });
    expect(rest.clampsOffAt?.toISOString()).toBe('2026-03-29T08:00:00.000Z');
  });

  it('holds the bench until the later of clamps off and may be worked', () => {
    const until = (
      clampsOffHours: string | null,
      workedHours: string | null,
      stringsHours: string | null,
    ) => restHoldsUntil(restFacts(start, { clampsOffHours, workedHours, stringsHours }))?.name;
    expect(until('2', '24', '48')).toBe('may be worked');
    expect(until('24', '24', '48')).toBe('clamps off');
    expect(until(null, null, '48')).toBe('may carry strings');
    expect(until(null, null, null)).toBeUndefined();
  });
});
