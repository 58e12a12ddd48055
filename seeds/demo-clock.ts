import { Temporal } from 'temporal-polyfill';

/** Times of the demo, counted back from the moment it is loaded, in the shop's zone. */
export interface DemoClock {
  /** Now: nothing in the demo is later. */
  now: Date;
  /** A clock time some working days ago (Monday to Friday), "10:12". */
  workday: (daysAgo: number, time: string) => Date;
  /** About so many hours ago, to the minute, moved into the shop's hours where it would be night. */
  hoursAgo: (hours: number) => Date;
  /** The day so many days from now, as people promise it: "2026-04-24". */
  dayAhead: (days: number) => string;
}

const isWeekend = (day: Temporal.PlainDate) => day.dayOfWeek > 5;

function workdayBefore(day: Temporal.PlainDate, count: number): Temporal.PlainDate {
  let result = day;
  for (let left = count; left > 0; left -= 1) {
    do result = result.subtract({ days: 1 });
    while (isWeekend(result));
  }
  return result;
}

const OPENS = { hour: 8, minute: 10 };
const ENDS = { hour: 17, minute: 30 };
/** The longest "hours ago" that is asked for, with room. */
const REACH_HOURS = 12;
const HOUR_MS = 3_600_000;

function hoursBefore(here: Temporal.ZonedDateTime, hours: number): Temporal.ZonedDateTime {
  const opened = here.startOfDay().with(OPENS);
  // Before the shop is well open, yesterday was the last day of work.
  if (here.epochMilliseconds - opened.epochMilliseconds < HOUR_MS / 2)
    return here.startOfDay().subtract({ days: 1 }).with(ENDS).subtract(minutes(hours));
  const exact = here.subtract(minutes(hours));
  if (exact.epochMilliseconds >= opened.epochMilliseconds) return exact;
  const open = here.epochMilliseconds - opened.epochMilliseconds;
  return opened.add({ milliseconds: Math.round(open * (1 - hours / REACH_HOURS)) });
}

const minutes = (hours: number) => ({ minutes: Math.round(hours * 60) });

/** The clock of a demo that is loaded at `now`. */
export function demoClock(now: Date, zone: string): DemoClock {
  const here = Temporal.Instant.fromEpochMilliseconds(now.getTime()).toZonedDateTimeISO(zone);
  return {
    now,
    workday: (daysAgo, time) => {
      const day = workdayBefore(here.toPlainDate(), daysAgo);
      const at = day.toZonedDateTime({ timeZone: zone, plainTime: Temporal.PlainTime.from(time) });
      return new Date(at.epochMilliseconds);
    },
    hoursAgo: (hours) => {
      const at = hoursBefore(here, hours).round({ smallestUnit: 'minute', roundingMode: 'floor' });
      return new Date(at.epochMilliseconds);
    },
    dayAhead: (days) => {
      const day = here.toPlainDate().add({ days });
      return (isWeekend(day) ? day.add({ days: 8 - day.dayOfWeek }) : day).toString();
    },
  };
}
