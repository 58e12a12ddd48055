import { run, type Transaction } from '#server/db/sql.ts';

/** Counts a change of the case, in the transaction of the change, so that open pages can tell. */
export async function touchCase(tx: Transaction, caseId: string): Promise<void> {
  await run('UPDATE cases SET version = version + 1 WHERE id = ?', [caseId], tx);
}
