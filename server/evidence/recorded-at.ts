import { Conflict } from '#domain/errors.ts';

const GRACE_MS = 5 * 60_000;

/**
 * The time an entry is recorded at. Along the log it never goes back: a clock that is up to five
 * minutes behind the last entry repeats that entry's time.
 * @throws Conflict when the clock is further behind, until it is set right
 */
export function recordedAt(now: Date, last: Date | null): Date {
  if (last === null || now >= last) return now;
  if (last.getTime() - now.getTime() <= GRACE_MS) return last;
  throw new Conflict(
    `The server’s clock reads ${now.toISOString()}, but the last entry was sealed at ` +
      `${last.toISOString()}. Set the clock right, then seal again; if it was wrong before, run npm run log:clock.`,
  );
}
