import { describe, expect, test } from 'vitest';
import { demoClock } from './demo-clock.ts';

const ZONE = 'Europe/London';
const at = (iso: string) => demoClock(new Date(iso), ZONE);

describe('the demo’s clock', () => {
  test('counts working days back over a weekend', () => {
    expect(at('2026-11-30T11:00:00Z').workday(1, '09:40').toISOString()).toBe(
      '2026-11-27T09:40:00.000Z',
    );
  });

  test('keeps clock times over the end of summer time', () => {
    expect(at('2026-10-28T11:00:00Z').workday(5, '10:12').toISOString()).toBe(
      '2026-10-21T09:12:00.000Z',
    );
  });

  test('promises no day at the weekend', () => {
    expect(at('2026-12-01T11:00:00Z').dayAhead(4)).toBe('2026-12-07');
    expect(at('2026-12-01T11:00:00Z').dayAhead(3)).toBe('2026-12-04');
  });

  test.each([
    ['in the afternoon, exactly', '2026-12-01T15:00:00Z', 4.4, '2026-12-01T10:36:00.000Z'],
    [
      'in the morning, after the shop opened',
      '2026-12-01T09:10:00Z',
      6,
      '2026-12-01T08:40:00.000Z',
    ],
    ['at night, on the day before', '2026-12-01T03:00:00Z', 4.5, '2026-11-30T13:00:00.000Z'],
  ])('goes back some hours: %s', (_when, now, hours, expected) => {
    expect(at(now).hoursAgo(hours).toISOString()).toBe(expected);
  });

  test('never goes beyond now', () => {
    for (let hour = 0; hour < 24; hour += 1) {
      const now = new Date(Date.UTC(2026, 11, 1, hour, 35));
      expect(demoClock(now, ZONE).hoursAgo(1.4).getTime()).toBeLessThanOrEqual(now.getTime());
    }
  });
});
