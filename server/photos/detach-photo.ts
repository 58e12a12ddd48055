import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, transaction } from '#server/db/sql.ts';
import { lockDraft } from '#server/entries/lock-draft.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';

/**
 * Takes a photo off a draft with its caption and pins. The photo itself stays in the case: nothing
 * that was once acknowledged is thrown away.
 * Throws NotAllowed, NotFound, Conflict once the entry is sealed.
 */
export async function detachPhoto(
  viewer: Viewer,
  { caseNumber, entryId, photoId }: { caseNumber: string; entryId: string; photoId: string },
): Promise<void> {
  demand(viewer, 'add photos and notes');
  const staff = staffOnly(viewer);
  await transaction(async (tx) => {
    const { id: caseId } = await lockCase(tx, caseNumber);
    await lockDraft(tx, staff, { caseId, entryId });
    const gone = await run(
      'DELETE FROM entry_photos WHERE entry_id = ? AND photo_id = ?',
      [entryId, photoId],
      tx,
    );
    if (gone === 0) throw new NotFound('No such photo is on this entry. Open the entry again.');
    await touchCase(tx, caseId);
  });
}
