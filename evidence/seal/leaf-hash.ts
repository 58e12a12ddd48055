import { sha256 } from '#evidence/bytes/sha256.ts';

/** Leaf hash of RFC 9162 §2.1.1: SHA-256(00 ‖ entry). A warranty's is called its seal value. */
export function leafHash(entry: Uint8Array): Uint8Array {
  return sha256(Uint8Array.of(0), entry);
}
