/** The three times a rest may have, in the order in which they fall. */
export const REST_TIME_NAMES = ['clamps off', 'may be worked', 'may carry strings'] as const;
export type RestTimeName = (typeof REST_TIME_NAMES)[number];

/** Hours from the start of a rest to each of its times, digits as typed; null where a time is not used. */
export interface RestHours {
  clampsOffHours: string | null;
  workedHours: string | null;
  stringsHours: string | null;
}

/** A rest as facts: when it began and the instants at which its times come. */
export interface RestFacts {
  startedAt: Date;
  clampsOffAt: Date | null;
  workedAt: Date | null;
  stringsAt: Date | null;
}

/** One named time of a rest. */
export interface RestTime {
  name: RestTimeName;
  at: Date;
}

const HOUR = 3_600_000;

const after = (start: Date, hours: string | null) =>
  hours === null ? null : new Date(start.getTime() + Math.round(Number(hours) * HOUR));

/**
 * The instants of a rest that starts at `startedAt`. Hours are elapsed hours: glue does not know of
 * summer time, so a rest over a clock change ends an hour earlier or later by the clock.
 */
export function restFacts(startedAt: Date, hours: RestHours): RestFacts {
  return {
    startedAt,
    clampsOffAt: after(startedAt, hours.clampsOffHours),
    workedAt: after(startedAt, hours.workedHours),
    stringsAt: after(startedAt, hours.stringsHours),
  };
}

/** The times a rest has, in their order. */
export function restTimes(rest: RestFacts): RestTime[] {
  const at = [rest.clampsOffAt, rest.workedAt, rest.stringsAt];
  return REST_TIME_NAMES.flatMap((name, index) => {
    const time = at[index];
    return time ? [{ name, at: time }] : [];
  });
}

/**
 * When a rest stops holding up the bench: at the later of clamps off and may be worked. The wait for
 * strings alone leaves other work free, so it holds only a rest that has no other time.
 */
export function restHoldsUntil(rest: RestFacts): RestTime | null {
  const times = restTimes(rest);
  const holding = times.filter(({ name }) => name !== 'may carry strings');
  const held = holding.length > 0 ? holding : times;
  // Of two equal times the earlier name wins: clamps come off before the joint can be worked.
  return held.reduce<RestTime | null>(
    (last, time) => (last && last.at >= time.at ? last : time),
    null,
  );
}
