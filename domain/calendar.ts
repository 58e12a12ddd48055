import { Temporal } from 'temporal-polyfill';

/** A calendar day without a time or a zone: "2026-04-24". */
export type Day = string;

/** Whether `text` is a calendar day that exists, from 1970 to 2200, written as "2026-04-24". */
export function isDay(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  try {
    const { year } = Temporal.PlainDate.from(text, { overflow: 'reject' });
    return year >= 1970 && year <= 2200;
  } catch {
    return false;
  }
}

const inZone = (instant: Date, zone: string) =>
  Temporal.Instant.fromEpochMilliseconds(instant.getTime()).toZonedDateTimeISO(zone);

/** The calendar day on which `instant` falls in `zone` (an IANA name). */
export function dayIn(instant: Date, zone: string): Day {
  return inZone(instant, zone).toPlainDate().toString();
}

/** `instant` as clock and offset in `zone`: "2026-07-01T13:00:00+01:00". */
export function clockIn(instant: Date, zone: string): string {
  return inZone(instant, zone).toString({ timeZoneName: 'never', smallestUnit: 'second' });
}

/** `day` moved by `days`, back when negative. */
export function addDays(day: Day, days: number): Day {
  return Temporal.PlainDate.from(day).add({ days }).toString();
}

/**
 * `day` moved by whole months; where the month is too short, its last day (31 January and one month
 * is 28 or 29 February). Add all months at once: one by one gives another day.
 */
export function addMonths(day: Day, months: number): Day {
  return Temporal.PlainDate.from(day).add({ months }).toString();
}

/** 1 for Monday to 7 for Sunday. */
export function weekday(day: Day): number {
  return Temporal.PlainDate.from(day).dayOfWeek;
}

/** The first instant of `day` in `zone`: not midnight where the clocks skip it. */
export function startOfDay(day: Day, zone: string): Date {
  return new Date(Temporal.PlainDate.from(day).toZonedDateTime(zone).epochMilliseconds);
}

/** The instants a clock time ("2026-11-01T01:30") can mean in `zone`. */
export type ClockMeaning =
  | { kind: 'one'; at: Date }
  /** The clocks went back: it was shown twice. */
  | { kind: 'twice'; first: Date; second: Date }
  /** The clocks went forward: it was never shown. */
  | { kind: 'never' };

/**
 * What a typed clock time means in `zone`. A zone is never guessed, and neither is one of two
 * meanings: the caller asks. Throws RangeError for text that is no clock time.
 */
export function readClock(clock: string, zone: string): ClockMeaning {
  const local = Temporal.PlainDateTime.from(clock, { overflow: 'reject' });
  const at = (disambiguation: 'earlier' | 'later') =>
    local.toZonedDateTime(zone, { disambiguation });
  const [first, second] = [at('earlier'), at('later')];
  if (first.equals(second)) return { kind: 'one', at: new Date(first.epochMilliseconds) };
  if (!first.toPlainDateTime().equals(local)) return { kind: 'never' };
  return {
    kind: 'twice',
    first: new Date(first.epochMilliseconds),
    second: new Date(second.epochMilliseconds),
  };
}

/** How long a warranty covers: calendar days in the shop's zone, and the instant at which it is over. */
export interface WarrantyTerm {
  startsOn: Day;
  lastDay: Day;
  /** The first instant that is no longer covered. */
  endsAt: Date;
}

/**
 * The term of a warranty of `months` on work completed at `completedAt`: it starts on that day in the
 * shop's zone, its last covered day is that many months on, and it ends when the next day begins there.
 */
export function warrantyTerm(completedAt: Date, zone: string, months: number): WarrantyTerm {
  const startsOn = dayIn(completedAt, zone);
  const lastDay = addMonths(startsOn, months);
  return { startsOn, lastDay, endsAt: startOfDay(addDays(lastDay, 1), zone) };
}

/** A day in full words for letters: "Friday 24 April 2026". */
export function dayInWords(day: Day): string {
  const words = { weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' } as const;
  // Some versions of the locale data put a comma after the weekday.
  return Temporal.PlainDate.from(day).toLocaleString('en-GB', words).replace(',', '');
}
