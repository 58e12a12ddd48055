import { Temporal } from 'temporal-polyfill';

/** Times of the demo, counted back from the moment it is loaded, in the shop's zone. */
export interface DemoClock {
  /** Now: nothing in the demo is later. */
  now: Date;
  /** A clock time some working days ago (Monday to Friday), "10:12". */
  workday: (daysAgo: number, time: string) => Date;
  /** So many hours ago, to the minute. */
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
    hoursAgo: (hours) =>
      new Date(Math.floor((now.getTime() - hours * 3_600_000) / 60_000) * 60_000),
    dayAhead: (days) => {
      const day = here.toPlainDate().add({ days });
      return (isWeekend(day) ? day.add({ days: 8 - day.dayOfWeek }) : day).toString();
    },
  };
}
