import { concat } from '#evidence/bytes/concat.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { checkSalt } from '#evidence/seal/check-salt.ts';

const TAG = concat(toUtf8('witnessmark/part/v1'), Uint8Array.of(0));

/**
 * Commitment to one part of an entry: it can be disclosed or erased without touching the others.
 * @param name the part's name, for example `shown`; part of what is hashed
 * @param salt 32 random bytes used for nothing else
 * @param bytes the part as sealed JSON
 * @returns SHA-256("witnessmark/part/v1" ‖ 00 ‖ name ‖ 00 ‖ salt ‖ bytes)
 * @throws EncodingError when the salt is not 32 bytes
 */
export function partCommitment(name: string, salt: Uint8Array, bytes: Uint8Array): Uint8Array {
  checkSalt(salt);
  return sha256(TAG, toUtf8(name), Uint8Array.of(0), salt, bytes);
}
