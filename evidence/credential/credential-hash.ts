import { sha256 } from '#evidence/bytes/sha256.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';

/** What a `warranty` leaf shows of its credential: SHA-256 of the ASCII of the compact JWS. */
export function credentialHash(jws: string): Uint8Array {
  return sha256(toUtf8(jws));
}
