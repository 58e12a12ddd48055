import { Conflict } from '#domain/errors.ts';
import type { PhotoType } from '#domain/photo-file.ts';
import { may } from '#domain/rights.ts';
import type { StaffViewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { Photo } from '#server/db/models/photo.ts';
import { run, select, type Transaction, transaction } from '#server/db/sql.ts';
import { CASE_CLOSED } from '#server/entries/add-entry.ts';
import { queueJob } from '#server/jobs/queue-job.ts';
import { lockCase } from '#server/record/lock-case.ts';
import { findSamePhoto, type KnownPhoto } from './find-same-photo.ts';
import { linkPhoto } from './link-photo.ts';
import type { PhotoToPut } from './photo-to-put.ts';

/** An original that is in the store, whole and equal to what was sent. */
export interface StoredOriginal {
  objectKey: string;
  mediaType: PhotoType;
  width: number;
  height: number;
}

export interface KeptPhoto {
  photo: KnownPhoto;
  /** False when the same file was there already; the object given here is then one too many. */
  isNew: boolean;
  /** Whether it is on the entry that was named; null when none was. */
  linked: boolean | null;
}

/** Whether the named entry is a draft of this case that the viewer may change. */
async function mayLink(
  tx: Transaction,
  viewer: StaffViewer,
  { caseId, entryId }: { caseId: string; entryId: string },
): Promise<boolean> {
  const [row] = await select<{ writtenBy: string | null }>(
    `SELECT written_by AS writtenBy FROM entries
     WHERE id = ? AND case_id = ? AND leaf_index IS NULL FOR UPDATE`,
    [entryId, caseId],
    tx,
  );
  return row !== undefined && (row.writtenBy === viewer.personId || may(viewer, 'add entry'));
}

async function nextNumber(tx: Transaction, caseId: string): Promise<number> {
  await run('UPDATE cases SET last_photo = last_photo + 1 WHERE id = ?', [caseId], tx);
  const [row] = await select<{ last: number }>(
    'SELECT last_photo AS last FROM cases WHERE id = ?',
    [caseId],
    tx,
  );
  return row?.last ?? 0;
}

/**
 * Writes down a photo whose original is stored, or finds the one that is there already, and links it
 * to its draft: all of it or nothing, one upload of a case after the other. `original` is null when
 * the photo must be there already. Returns null when it then is not.
 */
export async function keepPhoto(
  viewer: StaffViewer,
  { caseNumber, photoId, sha256, length, fileName, entryId }: PhotoToPut,
  original: StoredOriginal | null,
  now: Date,
): Promise<KeptPhoto | null> {
  return transaction(async (tx) => {
    const { id: caseId, closedAt } = await lockCase(tx, caseNumber);
    const link = entryId !== null && (await mayLink(tx, viewer, { caseId, entryId }));
    if (closedAt !== null && !link) throw new Conflict(CASE_CLOSED);

    const same = await findSamePhoto({ caseId, photoId, sha256 }, tx);
    if (same === null && original === null) return null;
    const photo = same ?? { id: photoId, number: await nextNumber(tx, caseId), sha256 };
    if (same === null && original !== null) {
      const facts = { caseId, fileName, bytes: length, uploadedBy: viewer.personId };
      await Photo.create(
        {
          ...{ ...photo, ...facts, ...original },
          sha256: Buffer.from(sha256, 'hex'),
          receivedAt: now,
        },
        { transaction: tx },
      );
      await queueJob(
        tx,
        { kind: 'derive-photo', payload: { photoId }, caseId, onceKey: `derive-photo:${photoId}` },
        { now },
      );
      await recordAct(tx, viewer, { act: 'added a photo', caseId, subjectId: photoId }, { now });
    }
    if (link) await linkPhoto(tx, { entryId, photoId: photo.id, expectedAs: photoId });
    await touchCase(tx, caseId);
    return { photo, isNew: same === null, linked: entryId === null ? null : link };
  });
}
