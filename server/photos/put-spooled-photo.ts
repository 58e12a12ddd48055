import { createHash } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { v7 } from 'uuid';
import { TooLarge } from '#domain/errors.ts';
import { MAX_PHOTO_BYTES } from '#domain/photo-file.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import type { KeptPhoto } from './keep-photo.ts';
import type { PhotoToPut } from './photo-to-put.ts';
import { putPhoto } from './put-photo.ts';

/** A photo out of a plain form: its sender knows neither hash nor length. */
export type SpooledPhoto = Pick<PhotoToPut, 'caseNumber' | 'fileName' | 'entryId' | 'mediaType'>;

/**
 * Takes in a photo of unknown length and hash: by way of a file of the server's own, which is gone
 * when this returns or throws. Throws as `putPhoto` does.
 */
export async function putSpooledPhoto(
  viewer: Viewer,
  photo: SpooledPhoto,
  source: AsyncIterable<Uint8Array>,
): Promise<KeptPhoto> {
  demand(viewer, 'add photos and notes');
  const folder = await mkdtemp(join(tmpdir(), 'witnessmark-photo-'));
  try {
    const file = join(folder, 'original');
    const hash = createHash('sha256');
    let length = 0;
    await pipeline(
      source,
      async function* (pieces: AsyncIterable<Uint8Array>) {
        for await (const piece of pieces) {
          length += piece.length;
          if (length > MAX_PHOTO_BYTES) {
            throw new TooLarge('This file has more than 50 MB. Make the photo smaller.');
          }
          hash.update(piece);
          yield piece;
        }
      },
      createWriteStream(file, { mode: 0o600 }),
    );
    const facts = { photoId: v7(), sha256: hash.digest('hex'), length };
    return await putPhoto(viewer, { ...photo, ...facts }, createReadStream(file));
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
