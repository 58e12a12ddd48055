import { Conflict } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { run, transaction } from '#server/db/sql.ts';
import { chainOf } from './chain-of.ts';
import { sealClose } from './close-case.ts';
import { lockCase, staffOnly } from './lock-case.ts';
import { sealEvent } from './seal-event.ts';
import { staffPart } from './person-in-record.ts';

/**
 * Records that the instrument went back to its owner. The record demands that nothing stands between
 * the close and the hand-back; where a correction or a warranty was sealed after the close, the case
 * is closed anew first and everything is listed again.
 * @throws NotFound, NotAllowed by role; Conflict when the case is not closed or was handed back
 */
export async function handBack(
  viewer: Viewer,
  { caseNumber }: { caseNumber: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<void> {
  demand(viewer, 'hand back');
  const staff = staffOnly(viewer);
  await transaction(async (tx) => {
    const repair = await lockCase(tx, caseNumber);
    if (!repair.closedAt) {
      throw new Conflict('This case is not closed yet. Close it, then hand the instrument back.');
    }
    if (repair.handedBackAt) throw new Conflict('This instrument was handed back already.');
    const last = (await chainOf(tx, repair.record)).at(-1);
    const close = last?.header.kind === 'close' ? last : await sealClose(tx, repair, staff, now);
    const { recordedAt } = await sealEvent(tx, {
      caseId: repair.id,
      record: repair.record,
      kind: 'handed-back',
      phase: 'after',
      shown: { v: 1, text: 'Handed back to the owner.' },
      parts: staffPart(staff),
      names: [close.commitment],
      by: staff,
      now,
    });
    await run('UPDATE cases SET handed_back_at = ? WHERE id = ?', [recordedAt, repair.id], tx);
    await recordAct(tx, staff, { act: 'handed back', caseId: repair.id });
  });
}
