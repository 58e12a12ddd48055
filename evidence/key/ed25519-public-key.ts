import { ed25519 } from '@noble/curves/ed25519.js';
import { KeyError } from '#evidence/errors.ts';

/**
 * The 32-byte public key of a secret one (RFC 8032 §5.1.5).
 * @param secretKey the 32-byte seed
 * @throws KeyError for another length
 */
export function ed25519PublicKey(secretKey: Uint8Array): Uint8Array {
  if (secretKey.length !== 32) throw new KeyError('An Ed25519 secret key is 32 bytes long.');
  return ed25519.getPublicKey(secretKey);
}
