import { sha256 } from '#evidence/bytes/sha256.ts';

/** Hash of an inner node, RFC 9162 §2.1.1: SHA-256(01 ‖ left ‖ right). */
export function nodeHash(left: Uint8Array, right: Uint8Array): Uint8Array {
  return sha256(Uint8Array.of(1), left, right);
}
