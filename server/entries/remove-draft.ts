import { Conflict } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';
import { lockDraft } from './lock-draft.ts';

/**
 * Removes a draft with its rest; its photos stay in the case. The first entry of a case stays: it is
 * how the instrument came in. Throws NotFound, Conflict once it is sealed or when it is the first.
 */
export async function removeDraft(
  viewer: Viewer,
  { caseNumber, entryId }: { caseNumber: string; entryId: string },
  { now = new Date() } = {},
): Promise<void> {
  demand(viewer, 'add photos and notes');
  const staff = staffOnly(viewer);
  await transaction(async (tx) => {
    const { id: caseId } = await lockCase(tx, caseNumber);
    await lockDraft(tx, staff, { caseId, entryId });
    const [first] = await select<{ id: string }>(
      'SELECT id FROM entries WHERE case_id = ? ORDER BY written_at, id LIMIT 1',
      [caseId],
      tx,
    );
    if (first?.id === entryId)
      throw new Conflict('This entry says how the instrument came in. Change it instead.');
    await run('DELETE FROM rests WHERE entry_id = ?', [entryId], tx);
    await run('DELETE FROM entry_photos WHERE entry_id = ?', [entryId], tx);
    await run('DELETE FROM entries WHERE id = ?', [entryId], tx);
    await touchCase(tx, caseId);
    await recordAct(tx, viewer, { act: 'removed a draft', caseId, subjectId: entryId }, { now });
  });
}
