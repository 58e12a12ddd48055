const FIRST_MS = 2_000;
const LONGEST_MS = 60_000;

/** How long to wait before the next attempt, in ms: 2 s, 4 s, 8 s … at most a minute, a little apart from each other. */
export function backOff(attempts: number, random = Math.random): number {
  const full = Math.min(LONGEST_MS, FIRST_MS * 2 ** (attempts - 1));
  return Math.round(full * (0.75 + random() / 4));
}
