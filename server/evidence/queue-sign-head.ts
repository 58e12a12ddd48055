import { queueJob } from '#server/jobs/queue-job.ts';
import type { Transaction } from '#server/db/sql.ts';

const HOUR = 3_600_000;

/**
 * Asks for a checkpoint at the next full hour: once an hour, and only if the log has grown. Signing
 * waits for the store; the entry does not.
 */
export async function queueSignHead(tx: Transaction): Promise<void> {
  const dueAt = new Date(Math.ceil(Date.now() / HOUR) * HOUR);
  await queueJob(tx, {
    kind: 'sign-head',
    payload: {},
    onceKey: `sign-head/${dueAt.toISOString()}`,
    dueAt,
  });
}
