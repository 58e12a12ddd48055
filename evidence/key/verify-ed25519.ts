import { ed25519 } from '@noble/curves/ed25519.js';
import { sha512 } from '@noble/hashes/sha2.js';
import { concat } from '#evidence/bytes/concat.ts';
import { equal } from '#evidence/bytes/equal.ts';

const { Point } = ed25519;

/**
 * Whether an Ed25519 signature holds, in the narrowest reading of RFC 8032 §5.1.7, so that one
 * signature has one answer everywhere: S below the group order, A and R in canonical form, no A of
 * small order, and the equation without the cofactor, S·B = R + k·A. The library's own check
 * multiplies by the cofactor, which lets through signatures that OpenSSL and Go refuse.
 * @param signature 64 bytes, R then S
 * @param publicKey 32 bytes, A
 * @returns false for anything malformed; it never throws
 */
export function verifyEd25519(
  signature: Uint8Array,
  message: Uint8Array,
  publicKey: Uint8Array,
): boolean {
  if (signature.length !== 64 || publicKey.length !== 32) return false;
  const encodedR = signature.slice(0, 32);
  const s = littleEndian(signature.slice(32));
  if (s >= Point.Fn.ORDER) return false;
  try {
    const A = Point.fromBytes(publicKey);
    const R = Point.fromBytes(encodedR);
    if (A.isSmallOrder()) return false;
    // Decoding is strict already; re-encoding says so without leaning on the library's options.
    if (!equal(A.toBytes(), publicKey) || !equal(R.toBytes(), encodedR)) return false;
    const k = Point.Fn.create(littleEndian(sha512(concat(encodedR, publicKey, message))));
    return Point.BASE.multiplyUnsafe(s).equals(R.add(A.multiplyUnsafe(k)));
  } catch {
    return false;
  }
}

function littleEndian(bytes: Uint8Array): bigint {
  return bytes.reduceRight((number, byte) => (number << 8n) | BigInt(byte), 0n);
}
