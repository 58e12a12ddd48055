import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { photoCommitment, type PhotoCopy } from '#evidence/seal/photo-commitment.ts';
import type { RecordShown } from '#evidence/verify/read-record.ts';

/** Where a file was found: photo `n` of the entry at `seq`, and which of its two files it is. */
export type PhotoMatch = { seq: number; n: number; copy: PhotoCopy };

const COPIES = ['original', 'published'] as const;

/**
 * Holds a picture's file against every photo of a checked record whose salt is disclosed. It says
 * nothing of pictures that only look alike, and never changes the record's verdict.
 * @param file the exact bytes
 * @returns how many files could be compared, and which of them this is; none when it is not
 *   among them
 */
export function comparePhoto(
  file: Uint8Array,
  record: RecordShown,
): { compared: number; matches: PhotoMatch[] } {
  const hash = sha256(file);
  let compared = 0;
  const matches: PhotoMatch[] = [];
  for (const { seq, photos } of record.entries) {
    for (const photo of photos) {
      for (const copy of COPIES) {
        const salt = photo.salts[copy];
        if (salt === null) continue;
        compared += 1;
        const commitment = toHex(photoCommitment(copy, fromHex(salt, 32), hash));
        if (commitment === photo[copy]) matches.push({ seq, n: photo.n, copy });
      }
    }
  }
  return { compared, matches };
}
