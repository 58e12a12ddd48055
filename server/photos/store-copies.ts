import { createHash } from 'node:crypto';
import type { PictureCopy } from '#server/images/derive-picture.ts';
import { newKey } from '#server/storage/keys.ts';
import { removeObject } from '#server/storage/objects.ts';
import { putStream } from '#server/storage/put-stream.ts';

/** A copy that is in the store. */
export interface StoredCopy {
  edge: number;
  objectKey: string;
  sha256: Buffer;
  bytes: number;
  width: number;
  height: number;
}

async function* whole(bytes: Buffer) {
  yield bytes;
}

async function storeCopy({ edge, width, height, bytes }: PictureCopy): Promise<StoredCopy> {
  const objectKey = newKey('copies');
  const facts = { length: bytes.length, mediaType: 'image/webp' };
  await putStream(objectKey, whole(bytes), facts);
  const sha256 = createHash('sha256').update(bytes).digest();
  return { edge, objectKey, sha256, bytes: bytes.length, width, height };
}

/** Puts the copies into the store under new keys. Throws Unavailable; what is there then is swept later. */
export function storeCopies(copies: PictureCopy[]): Promise<StoredCopy[]> {
  return Promise.all(copies.map(storeCopy));
}

/** Removes copies that nobody came to need. */
export async function dropCopies(copies: StoredCopy[]): Promise<void> {
  await Promise.all(copies.map(({ objectKey }) => removeObject(objectKey)));
}
