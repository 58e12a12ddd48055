import { toHex } from '#evidence/bytes/hex.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { lockCaseById } from '#server/record/lock-case.ts';
import { sealEvent } from '#server/record/seal-event.ts';
import type { SealedWarranty } from './sealed-warranty.ts';

/** Fourth step: the leaf that holds the paper's length and hash. Nothing happens when it is there. */
export async function sealPaper(warranty: SealedWarranty, now: Date): Promise<void> {
  await transaction(async (tx) => {
    const repair = await lockCaseById(tx, warranty.caseId);
    const [paper] = await select<{ id: string; length: number; sha256: Buffer }>(
      `SELECT id, length, sha256 FROM papers
       WHERE warranty_id = ? AND leaf_index IS NULL ORDER BY id LIMIT 1 FOR UPDATE`,
      [warranty.id],
      tx,
    );
    if (!paper) return;
    const { leafIndex } = await sealEvent(tx, {
      caseId: warranty.caseId,
      record: repair.record,
      kind: 'paper',
      phase: 'after',
      shown: { v: 1, length: paper.length, sha256: toHex(paper.sha256) },
      names: [warranty.commitment],
      by: null,
      now,
    });
    await run('UPDATE papers SET leaf_index = ? WHERE id = ?', [leafIndex, paper.id], tx);
  });
}
