import { Conflict } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { run, transaction } from '#server/db/sql.ts';
import { lockCase } from '#server/record/lock-case.ts';
import { touchCase } from './touch-case.ts';

/**
 * Notes that the owner was told, in person or by telephone, that the instrument is ready to go home.
 * Throws Conflict while the case is open.
 */
export async function tellOwner(
  viewer: Viewer,
  { caseNumber }: { caseNumber: string },
  { now = new Date() } = {},
): Promise<void> {
  demand(viewer, 'hand back');
  await transaction(async (tx) => {
    const { id, closedAt } = await lockCase(tx, caseNumber);
    if (!closedAt) throw new Conflict('The case is still open. Close it, then tell the owner.');
    await run('UPDATE cases SET owner_told_at = ? WHERE id = ?', [now, id], tx);
    await touchCase(tx, id);
    await recordAct(tx, viewer, { act: 'told the owner', caseId: id }, { now });
  });
}
