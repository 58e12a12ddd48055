import { EncodingError } from '#evidence/errors.ts';

/**
 * Four bytes of a whole number from 0 to 2^32 − 1, most significant byte first.
 * @throws EncodingError outside that range
 */
export function uint32(value: number): Uint8Array {
  if (!Number.isInteger(value) || value < 0 || value > 0xffffffff) {
    throw new EncodingError(`A whole number from 0 to 4294967295 was expected, not ${value}.`);
  }
  const bytes = new Uint8Array(4);
  new DataView(bytes.buffer).setUint32(0, value);
  return bytes;
}
