import { concat } from '#evidence/bytes/concat.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { checkSalt } from '#evidence/seal/check-salt.ts';

const TAG = concat(toUtf8('witnessmark/header/v1'), Uint8Array.of(0));

/**
 * C, the commitment to a header. Entries name one another by it.
 * @param salt 32 random bytes used for nothing else
 * @returns SHA-256("witnessmark/header/v1" ‖ 00 ‖ salt ‖ header)
 * @throws EncodingError when the salt is not 32 bytes
 */
export function headerCommitment(salt: Uint8Array, headerBytes: Uint8Array): Uint8Array {
  checkSalt(salt);
  return sha256(TAG, salt, headerBytes);
}
