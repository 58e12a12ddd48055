import { createHash } from 'node:crypto';
import { buffer } from 'node:stream/consumers';
import { Unavailable } from '#domain/errors.ts';
import { log } from '#server/log.ts';
import { getStream } from '#server/storage/objects.ts';

/**
 * The original's bytes, compared with the hash that was written down. Throws Unavailable when the
 * store does not give it, or gives other bytes.
 */
export async function readOriginal(photo: {
  id: string;
  objectKey: string;
  sha256: Buffer;
}): Promise<Buffer> {
  const stream = await getStream(photo.objectKey);
  if (stream === undefined) {
    log.error({ photo: photo.id }, 'an original is missing from the store');
    throw new Unavailable('store');
  }
  const bytes = await buffer(stream).catch(() => {
    throw new Unavailable('store');
  });
  if (!createHash('sha256').update(bytes).digest().equals(photo.sha256)) {
    log.error({ photo: photo.id }, 'an original is not what was stored');
    throw new Unavailable('store');
  }
  return bytes;
}
