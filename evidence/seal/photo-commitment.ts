import { concat } from '#evidence/bytes/concat.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { EncodingError } from '#evidence/errors.ts';
import { checkSalt } from '#evidence/seal/check-salt.ts';

const TAG = concat(toUtf8('witnessmark/photo/v1'), Uint8Array.of(0));

/** `original` is the file as it came in; `published` the copy that may be shown. */
export type PhotoCopy = 'original' | 'published';

/**
 * Commitment to one file of a photo. The raw hash is never disclosed, only the salt: without the
 * file nobody can tell which picture was meant.
 * @param salt 32 random bytes used for nothing else, not even the same file in another entry
 * @param fileHash SHA-256 of the file, 32 bytes
 * @returns SHA-256("witnessmark/photo/v1" ‖ 00 ‖ copy ‖ 00 ‖ salt ‖ fileHash)
 * @throws EncodingError when salt or hash are not 32 bytes
 */
export function photoCommitment(
  copy: PhotoCopy,
  salt: Uint8Array,
  fileHash: Uint8Array,
): Uint8Array {
  checkSalt(salt);
  if (fileHash.length !== 32) throw new EncodingError('A SHA-256 is 32 bytes long.');
  return sha256(TAG, toUtf8(copy), Uint8Array.of(0), salt, fileHash);
}
