import { sha256 as nobleSha256 } from '@noble/hashes/sha2.js';
import { concat } from '#evidence/bytes/concat.ts';

/**
 * SHA-256 (FIPS 180-4) over the arrays joined; 32 bytes. Not WebCrypto: that is asynchronous and
 * missing where a page has no secure context, and verifying must work there too.
 */
export function sha256(...arrays: Uint8Array[]): Uint8Array {
  return nobleSha256(arrays.length === 1 ? arrays[0]! : concat(...arrays));
}
