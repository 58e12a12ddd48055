import { v7 } from 'uuid';
import { run, type Transaction } from '../db/sql.ts';

export interface NewJob {
  kind: string;
  /** Anything JSON can say; emptied once the job is done. */
  payload: object;
  caseId?: string | null;
  /** A second job with the same key is not queued. */
  onceKey?: string | null;
  /** Not before this; by default at once. */
  dueAt?: Date;
}

/** Queues something slow or outside in the transaction of its cause: both happen or neither. */
export async function queueJob(
  tx: Transaction,
  { kind, payload, caseId = null, onceKey = null, dueAt }: NewJob,
  { now = new Date() } = {},
): Promise<void> {
  await run(
    `INSERT INTO outbox (id, kind, once_key, case_id, payload, created_at, due_at)
     VALUES (:id, :kind, :onceKey, :caseId, :payload, :now, :dueAt)
     ON DUPLICATE KEY UPDATE id = id`,
    { id: v7(), kind, onceKey, caseId, payload: JSON.stringify(payload), now, dueAt: dueAt ?? now },
    tx,
  );
}
