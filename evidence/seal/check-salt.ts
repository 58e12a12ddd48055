import { EncodingError } from '#evidence/errors.ts';

/**
 * A fixed length is what keeps salt and content apart in a hash input.
 * @throws EncodingError when a salt is not 32 bytes
 */
export function checkSalt(salt: Uint8Array): void {
  if (salt.length !== 32) throw new EncodingError('A salt is 32 bytes long.');
}
