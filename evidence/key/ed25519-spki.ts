import { concat } from '#evidence/bytes/concat.ts';
import { equal } from '#evidence/bytes/equal.ts';
import { fromHex } from '#evidence/bytes/hex.ts';
import { KeyError } from '#evidence/errors.ts';

/** SEQUENCE { SEQUENCE { OID 1.3.101.112 } BIT STRING } up to the key itself: RFC 8410 §4. */
const PREFIX = fromHex('302a300506032b6570032100');

/**
 * DER SubjectPublicKeyInfo of an Ed25519 public key, 44 bytes (RFC 8410 §4).
 * @throws KeyError when the key is not 32 bytes
 */
export function ed25519Spki(publicKey: Uint8Array): Uint8Array {
  if (publicKey.length !== 32) throw new KeyError('An Ed25519 public key is 32 bytes long.');
  return concat(PREFIX, publicKey);
}

/**
 * The 32-byte public key inside a DER SubjectPublicKeyInfo.
 * @throws KeyError when the bytes are not exactly an Ed25519 key
 */
export function ed25519FromSpki(spki: Uint8Array): Uint8Array {
  if (spki.length !== 44 || !equal(spki.subarray(0, 12), PREFIX)) {
    throw new KeyError('This is not an Ed25519 public key.');
  }
  return spki.slice(12);
}
