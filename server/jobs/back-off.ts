const FIRST_MS = 5_000;
const LONGEST_MS = 60 * 60 * 1000;

/** Attempts before a job is given up: the last comes about a day after the first. */
export const MOST_ATTEMPTS = 30;

/** How long to wait after the given number of failed attempts: 5 s, 20 s, 80 s … at most an hour. */
export function backOff(attempts: number): number {
  return Math.min(FIRST_MS * 4 ** (attempts - 1), LONGEST_MS);
}
