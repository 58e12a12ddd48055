import { concat } from '#evidence/bytes/concat.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { uint32 } from '#evidence/bytes/uint32.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { EncodingError } from '#evidence/errors.ts';

const TAG = concat(toUtf8('witnessmark/slot/v1'), Uint8Array.of(0));

/**
 * T, the tag of one place in one chain. Whoever knows the case id finds every entry of the case
 * among the public ones, and none can be kept back or made twice unseen.
 * @param caseId 16 bytes; sixteen zeros for the log's own chain
 * @param seq the place in the chain, from 0
 * @returns SHA-256("witnessmark/slot/v1" ‖ 00 ‖ caseId ‖ seq as four bytes, big end first)
 * @throws EncodingError when the id is not 16 bytes or seq no uint32
 */
export function slotTag(caseId: Uint8Array, seq: number): Uint8Array {
  if (caseId.length !== 16) throw new EncodingError('A case id is 16 bytes long.');
  return sha256(TAG, caseId, uint32(seq));
}
