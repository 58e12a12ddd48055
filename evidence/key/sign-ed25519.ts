import { ed25519 } from '@noble/curves/ed25519.js';
import { KeyError } from '#evidence/errors.ts';

/**
 * Ed25519 signature (RFC 8032 §5.1.6), 64 bytes, the same every time for the same input.
 * @param secretKey the 32-byte seed
 * @throws KeyError for another length
 */
export function signEd25519(message: Uint8Array, secretKey: Uint8Array): Uint8Array {
  if (secretKey.length !== 32) throw new KeyError('An Ed25519 secret key is 32 bytes long.');
  return ed25519.sign(message, secretKey);
}
