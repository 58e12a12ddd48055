import { describe, expect, it } from 'vitest';
import { addDays, isDay, startOfDay, weekday } from './calendar.ts';

describe('the calendar', () => {
  it.each(['2026-04-24', '2024-02-29', '1970-01-01', '2200-12-31'])('has %s', (day) => {
    expect(isDay(day)).toBe(true);
  });
  it.each([
    '2026-02-29',
    '2026-13-01',
    '2026-4-1',
    '20260401',
    '1969-12-31',
    '2201-01-01',
    '2026-04-24T00:00',
  ])('has no %s', (day) => {
    expect(isDay(day)).toBe(false);
  });
  it('moves by days over a month end, and knows the weekday', () => {
    expect(addDays('2024-02-28', 2)).toBe('2024-03-01');
    expect(addDays('2026-01-01', -1)).toBe('2025-12-31');
    // 15 April 2026 is a Wednesday.
    expect(weekday('2026-04-15')).toBe(3);
  });
  it('begins a day where the zone begins it', () => {
    // In Beirut the clocks go from 00:00 to 01:00 on 29 March 2026: the day has no midnight.
    expect(startOfDay('2026-03-29', 'Asia/Beirut').toISOString()).toBe('2026-03-28T22:00:00.000Z');
    expect(startOfDay('2026-04-24', 'Europe/London').toISOString()).toBe(
      '2026-04-23T23:00:00.000Z',
    );
  });
});
