import { describe, expect, it } from 'vitest';
import * as date from './date.ts';

const london = 'Europe/London';
const at = new Date('2026-04-16T08:40:00Z');

describe('dates in the shop’s time zone', () => {
  it('writes every form of one moment', () => {
    expect(date.clock(at, london)).toBe('09:40');
    expect(date.shortDay(at, london)).toBe('Thu 16 Apr');
    expect(date.day(at, london)).toBe('Thu 16 April');
    expect(date.dayTime(at, london)).toBe('Thu 16 April, 09:40');
    expect(date.weekTime(at, london)).toBe('Thu 09:40');
    expect(date.dateOnly(at, london)).toBe('16 April');
    expect(date.longDay(at, london)).toBe('Thursday 16 April');
    expect(date.longDayTime(at, london)).toBe('Thursday 16 April, 09:40');
    expect(date.dateYear(at, london)).toBe('16 April 2026');
    expect(date.dateYearTime(at, london)).toBe('16 April 2026, 09:40');
  });

  // Rules of the zones: IANA Time Zone Database (Tongatapu +13, Honolulu −10, Kolkata +05:30, no summer time in any).
  it.each([
    ['Pacific/Tongatapu', 'Thu 16 April, 21:40'],
    ['Pacific/Honolulu', 'Wed 15 April, 22:40'],
    ['Asia/Kolkata', 'Thu 16 April, 14:10'],
  ])('is never the machine’s own zone: %s', (zone, text) => {
    expect(date.dayTime(at, zone)).toBe(text);
  });

  it('follows the change to summer time', () => {
    // Europe/London, last Sunday of March 2026 at 01:00 UTC (IANA Time Zone Database).
    expect(date.clock(new Date('2026-03-29T00:59:00Z'), london)).toBe('00:59');
    expect(date.clock(new Date('2026-03-29T01:00:00Z'), london)).toBe('02:00');
  });

  it('writes midnight as 00:00 of the new day', () => {
    expect(date.dayTime(new Date('2026-01-01T00:00:00Z'), 'UTC')).toBe('Thu 1 January, 00:00');
  });

  it('says today only on the same day there', () => {
    const now = new Date('2026-04-16T22:30:00Z');
    expect(date.todayOr(at, now, london)).toBe('today, 09:40');
    expect(date.todayOr(at, now, 'Asia/Kolkata')).toBe('Thu 16 April, 14:10');
  });

  it.each(['Pacific/Kiritimati', 'Pacific/Auckland', 'Europe/London', 'Pacific/Pago_Pago'])(
    'shows a calendar date as that date in %s',
    (zone) => {
      for (const text of ['2026-01-01', '2026-07-31'])
        expect(date.dateYear(date.calendarDate(text, zone), zone)).toBe(
          text === '2026-01-01' ? '1 January 2026' : '31 July 2026',
        );
    },
  );

  it('gives the timeline a machine time beside the words', () => {
    expect(date.when(at, london)).toEqual({
      iso: '2026-04-16T08:40:00.000Z',
      date: 'Thu 16 Apr',
      time: '09:40',
    });
  });
});
