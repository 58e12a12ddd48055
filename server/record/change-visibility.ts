import { Conflict, NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { lockCase, staffOnly } from './lock-case.ts';
import { sealEvent } from './seal-event.ts';
import { staffPart } from './person-in-record.ts';

export interface VisibilityChange {
  caseNumber: string;
  entryId: string;
  to: 'shared' | 'bench';
  /** Numbers of photos of the entry; null for all that the entry holds. */
  photos: number[] | null;
}

interface Row {
  commitment: Buffer;
  shows: 0 | 1;
}

async function sealedEntry(tx: Transaction, caseId: string, entryId: string): Promise<Row> {
  const [row] = await select<Row>(
    `SELECT s.commitment,
            EXISTS (SELECT 1 FROM sealed_parts p WHERE p.leaf_index = s.leaf_index
                    AND p.name = 'shown' AND p.bytes IS NOT NULL) AS shows
     FROM entries e JOIN sealed_entries s ON s.leaf_index = e.leaf_index
     WHERE e.case_id = ? AND e.id = ? FOR UPDATE`,
    [caseId, entryId],
    tx,
  );
  if (!row) throw new NotFound();
  return row;
}

async function change(tx: Transaction, { entryId, to, photos }: VisibilityChange): Promise<number> {
  if (photos) {
    return run(
      `UPDATE entry_photos l JOIN photos f ON f.id = l.photo_id SET l.visibility = ?
       WHERE l.entry_id = ? AND f.number IN (?)`,
      [to, entryId, photos],
      tx,
    );
  }
  // Photos keep their own: what was kept back in a shared entry stays so when the entry is shared again.
  return run('UPDATE entries SET visibility = ? WHERE id = ?', [to, entryId], tx);
}

/**
 * Changes who may see a sealed entry or photos of it, by a sealed event of its own. What the owner
 * has seen before, they have seen; a copy that was kept stays theirs.
 * @throws NotFound, NotAllowed by role; Conflict when it is so already, or when an entry that was
 *   sealed for the bench only is to be shared
 */
export async function changeVisibility(
  viewer: Viewer,
  input: VisibilityChange,
  { now = new Date() }: { now?: Date } = {},
): Promise<void> {
  demand(viewer, 'change visibility');
  const staff = staffOnly(viewer);
  await transaction(async (tx) => {
    const repair = await lockCase(tx, input.caseNumber);
    const { commitment, shows } = await sealedEntry(tx, repair.id, input.entryId);
    if (input.to === 'shared' && !shows) {
      throw new Conflict(
        'This entry was sealed for the bench only. Write a shared entry that says what the owner may know.',
      );
    }
    if ((await change(tx, input)) === 0) {
      throw new Conflict('Nothing changes: it can be seen by the same people already.');
    }
    const n = input.photos && [...new Set(input.photos)].sort((a, b) => a - b);
    await sealEvent(tx, {
      caseId: repair.id,
      record: repair.record,
      kind: 'visibility',
      phase: 'during',
      shown: { v: 1, to: input.to, n },
      parts: staffPart(staff),
      names: [commitment],
      by: staff,
      now,
    });
    await recordAct(tx, staff, {
      act: 'changed visibility',
      caseId: repair.id,
      subjectId: input.entryId,
      detail: input.to,
    });
  });
}
