import { run } from '../db/sql.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/** Removes sessions, codes and rate counts that have ended; codes are kept a day for the record. */
export async function sweepExpired({ now = new Date() } = {}): Promise<void> {
  await run('DELETE FROM sessions WHERE expires_at <= ?', [now]);
  await run('DELETE FROM rate_counts WHERE expires_at <= ?', [now]);
  await run('DELETE FROM sign_in_codes WHERE expires_at <= ?', [new Date(now.getTime() - DAY_MS)]);
}
