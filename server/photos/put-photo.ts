import { Problem, Unavailable } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { StaffViewer, Viewer } from '#domain/viewer.ts';
import { log } from '#server/log.ts';
import { staffOnly } from '#server/record/lock-case.ts';
import { newKey } from '#server/storage/keys.ts';
import { lengthOf, removeObject } from '#server/storage/objects.ts';
import { putStream } from '#server/storage/put-stream.ts';
import { CheckedBody } from './checked-body.ts';
import { type KeptPhoto, keepPhoto, type StoredOriginal } from './keep-photo.ts';
import { checkPhotoToPut, type PhotoToPut } from './photo-to-put.ts';

interface Options {
  now?: Date;
  /** Asked when all bytes have come and before any of it counts: throws when the sender's right has ended meanwhile. */
  stillAllowed?: () => Promise<void>;
}

/** Takes back what an upload left in the store; what cannot be taken back is swept later. */
async function takeBack(key: string): Promise<void> {
  await removeObject(key).catch(() => log.warn({ key }, 'an object is left for the sweep'));
}

async function storeOriginal(
  body: CheckedBody,
  length: number,
  stillAllowed: () => Promise<void>,
): Promise<StoredOriginal> {
  const mediaType = await body.begin();
  const objectKey = newKey('originals');
  try {
    const { md5 } = await putStream(objectKey, body.pieces(stillAllowed), { length, mediaType });
    const isWhole = (await lengthOf(objectKey)) === length;
    if (!isWhole || (md5 !== null && md5 !== body.md5)) {
      log.error({ key: objectKey }, 'the object store has kept other bytes than it was given');
      throw new Unavailable('store');
    }
  } catch (error) {
    await takeBack(objectKey);
    throw error;
  }
  const { width, height } = body.walk;
  return { objectKey, mediaType, width, height };
}

/** Writes the row of a stored original; takes the original back when it is certain that there is none. */
async function settle(
  staff: StaffViewer,
  photo: PhotoToPut,
  original: StoredOriginal,
  now: Date,
): Promise<KeptPhoto> {
  try {
    const kept = await keepPhoto(staff, photo, original, now);
    if (kept === null) throw new Error('a stored original was not written down');
    if (!kept.isNew) await takeBack(original.objectKey);
    return kept;
  } catch (error) {
    // When the database went away while it committed, the row may be there and need its original.
    const rolledBack = error instanceof Problem && !(error instanceof Unavailable);
    if (rolledBack) await takeBack(original.objectKey);
    throw error;
  }
}

/**
 * Takes in one photo: streams it to the object store while it is checked, then writes its row. When
 * this returns, original and row are durable and equal to what was sent; when it throws, neither is
 * left. The same file twice, under one id or two, one after the other or at once, is one photo.
 *
 * Throws NotAllowed, NotFound for an unknown case, Conflict for a closed one, Invalid, TooLarge or
 * Unsupported for what is no photo the shop takes, ArrivedDamaged to have it sent again, and
 * Unavailable when store or database do not answer.
 */
export async function putPhoto(
  viewer: Viewer,
  input: PhotoToPut,
  source: AsyncIterable<Uint8Array>,
  { now = new Date(), stillAllowed = () => Promise.resolve() }: Options = {},
): Promise<KeptPhoto> {
  demand(viewer, 'add photos and notes');
  const staff = staffOnly(viewer);
  const photo = checkPhotoToPut(input);
  const there = await keepPhoto(staff, photo, null, now);
  if (there !== null) return there;
  const original = await storeOriginal(new CheckedBody(source, photo), photo.length, stillAllowed);
  return settle(staff, photo, original, now);
}
