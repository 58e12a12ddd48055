import { Temporal } from 'temporal-polyfill';
import type { Day } from '#domain/calendar.ts';

const inEnglish = (options: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat('en-GB', options);

/** "24 April 2028" */
export function dayInWords(day: Day): string {
  const date = new Date(`${day}T00:00:00Z`);
  const format = { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' } as const;
  return inEnglish(format).format(date);
}

/** "24 April 2026, 16:05" in the shop's time zone. */
export function timeInWords(at: Date, zone: string): string {
  const local = Temporal.Instant.fromEpochMilliseconds(at.getTime()).toZonedDateTimeISO(zone);
  const clock = local.toPlainTime().toString({ smallestUnit: 'minute' });
  return `${dayInWords(local.toPlainDate().toString())}, ${clock}`;
}

/** "2 years", "1 year", "18 months" */
export function termInWords(months: number): string {
  const [count, unit] = months % 12 === 0 ? [months / 12, 'year'] : [months, 'month'];
  return `${count} ${unit}${count === 1 ? '' : 's'}`;
}

/**
 * A serial number as the public may see it: its last two signs behind an ellipsis. One of three
 * signs or fewer would be given away by that and is left out.
 */
export function shortSerial(serial: string | null): string | null {
  const signs = [...(serial ?? '')];
  return signs.length > 3 ? `…${signs.slice(-2).join('')}` : null;
}
