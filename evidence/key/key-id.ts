import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';

/**
 * The id of a key, alike in a JWS, a QR, on paper and in the log: the first 16 bytes of SHA-256 of
 * its DER SubjectPublicKeyInfo, as 32 hex. Never the four bytes a signed note uses.
 */
export function keyId(spki: Uint8Array): string {
  return toHex(sha256(spki).subarray(0, 16));
}
