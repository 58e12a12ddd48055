import { z } from 'zod';
import type { PhotoType } from '#domain/photo-file.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { Photo } from '#server/db/models/photo.ts';
import { PhotoCopy } from '#server/db/models/photo-copy.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import type { DerivedPicture } from '#server/images/derive-picture.ts';
import { CannotDerive, picturePool } from '#server/images/picture-pool.ts';
import { readOriginal } from './read-original.ts';
import { dropCopies, storeCopies, type StoredCopy } from './store-copies.ts';

const PayloadSchema = z.object({ photoId: z.uuid() });

interface Waiting {
  id: string;
  caseId: string;
  objectKey: string;
  sha256: Buffer;
  mediaType: PhotoType;
}

async function findWaiting(photoId: string): Promise<Waiting | undefined> {
  const [row] = await select<Waiting>(
    `SELECT id, case_id AS caseId, object_key AS objectKey, sha256, media_type AS mediaType
     FROM photos WHERE id = ? AND state = 'waiting'`,
    [photoId],
  );
  return row;
}

/** Writes down that the copies are there, unless another worker did. Returns whether it was this one. */
async function markReady(
  { id, caseId }: Waiting,
  { width, height, placeholder, facts }: DerivedPicture,
  copies: StoredCopy[],
): Promise<boolean> {
  return transaction(async (tx) => {
    // The case first, as everywhere: two acts then never wait for each other.
    await touchCase(tx, caseId);
    const [changed] = await Photo.update(
      {
        state: 'ready',
        width,
        height,
        placeholder,
        takenClock: facts.taken?.clock ?? null,
        takenOffset: facts.taken?.offset ?? null,
        takenAt: facts.taken?.at ?? null,
        hasPosition: facts.hasPosition,
      },
      { where: { id, state: 'waiting' }, transaction: tx },
    );
    if (changed === 0) return false;
    await PhotoCopy.bulkCreate(
      copies.map((copy) => ({ ...copy, photoId: id })),
      { transaction: tx },
    );
    return true;
  });
}

async function markFailed({ id, caseId }: Waiting, because: string): Promise<void> {
  await transaction(async (tx) => {
    await touchCase(tx, caseId);
    await run(
      "UPDATE photos SET state = 'failed', failed_because = ? WHERE id = ? AND state = 'waiting'",
      [because, id],
      tx,
    );
  });
}

/**
 * The job 'derive-photo': makes a photo's copies, placeholder and facts. Done again it changes
 * nothing. A picture that cannot be decoded is marked failed with its sentence and its original kept.
 * Throws Unavailable, to be tried again later.
 */
export async function derivePhoto(payload: unknown): Promise<void> {
  const { photoId } = PayloadSchema.parse(payload);
  const photo = await findWaiting(photoId);
  if (photo === undefined) return;
  const file = await readOriginal(photo);
  try {
    const derived = await picturePool.derive({ file, type: photo.mediaType });
    const copies = await storeCopies(derived.copies);
    if (!(await markReady(photo, derived, copies))) await dropCopies(copies);
  } catch (error) {
    if (!(error instanceof CannotDerive)) throw error;
    await markFailed(photo, error.sentence);
  }
}
