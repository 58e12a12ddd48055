import { Conflict, NotAllowed, NotFound } from '#domain/errors.ts';
import { may } from '#domain/rights.ts';
import type { StaffViewer } from '#domain/viewer.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** A draft as an edit needs it. */
export interface LockedDraft {
  id: string;
  kind: string;
  writtenAt: Date;
}

interface Row extends LockedDraft {
  writtenBy: string | null;
  draft: string | null;
}

/**
 * Locks a draft of a case. The bench may change anyone's, the front desk its own.
 * Throws NotFound for an entry that is not of this case, Conflict once it is sealed, NotAllowed.
 */
export async function lockDraft(
  tx: Transaction,
  viewer: StaffViewer,
  { caseId, entryId }: { caseId: string; entryId: string },
): Promise<LockedDraft> {
  const [row] = await select<Row>(
    `SELECT id, kind, written_at AS writtenAt, written_by AS writtenBy, draft
     FROM entries WHERE id = ? AND case_id = ? FOR UPDATE`,
    [entryId, caseId],
    tx,
  );
  if (!row) throw new NotFound('No such entry is on this case. Open the case again.');
  const { draft, writtenBy, ...entry } = row;
  if (draft === null)
    throw new Conflict(
      'This entry is sealed. It is not changed any more; add a correction instead.',
    );
  if (writtenBy !== viewer.personId && !may(viewer, 'add entry'))
    throw new NotAllowed('Somebody else wrote this entry. Ask them, or the bench, to change it.');
  return entry;
}
