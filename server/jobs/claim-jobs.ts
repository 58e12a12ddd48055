import { run, select, transaction } from '../db/sql.ts';
import type { Job } from './job.ts';

/** A worker that stops renewing its claim is taken for dead after this long. */
export const CLAIM_MS = 30_000;

interface Row {
  id: string;
  kind: string;
  payload: string;
  attempts: number;
}

// Raw SQL: the ORM drops SKIP LOCKED on MariaDB, and workers would wait for each other.
const DUE = `
  SELECT id, kind, payload, attempts FROM outbox
  WHERE done_at IS NULL AND failed_at IS NULL AND due_at <= :now AND kind IN (:kinds)
    AND (claimed_until IS NULL OR claimed_until <= :now)
  ORDER BY due_at, id LIMIT :most FOR UPDATE SKIP LOCKED`;

/** Takes at most `most` due jobs of these kinds; no other worker gets them while the claim lasts. */
export async function claimJobs(
  kinds: string[],
  most: number,
  { now = new Date() } = {},
): Promise<Job[]> {
  if (kinds.length === 0 || most < 1) return [];
  return transaction(async (tx) => {
    const rows = await select<Row>(DUE, { now, kinds, most }, tx);
    if (rows.length === 0) return [];
    await run(
      'UPDATE outbox SET claimed_until = :until, attempts = attempts + 1 WHERE id IN (:ids)',
      { until: new Date(now.getTime() + CLAIM_MS), ids: rows.map(({ id }) => id) },
      tx,
    );
    return rows.map(({ id, kind, payload, attempts }) => ({
      id,
      kind,
      payload: JSON.parse(payload) as unknown,
      attempts: attempts + 1,
    }));
  });
}

/** Keeps the claim on a job that takes long. */
export async function renewClaim(id: string, { now = new Date() } = {}): Promise<void> {
  const until = new Date(now.getTime() + CLAIM_MS);
  await run('UPDATE outbox SET claimed_until = ? WHERE id = ? AND done_at IS NULL', [until, id]);
}
