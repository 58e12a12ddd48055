import { bytesToHex, hexToBytes } from '@noble/hashes/utils.js';
import { EncodingError } from '#evidence/errors.ts';

/** Full lower-case hexadecimal text of the bytes. */
export function toHex(bytes: Uint8Array): string {
  return bytesToHex(bytes);
}

/**
 * Bytes of full lower-case hexadecimal text.
 * @param length how many bytes are expected; any number when left out
 * @throws EncodingError for upper case, other signs, an odd count or another length
 */
export function fromHex(text: string, length?: number): Uint8Array {
  if (!/^(?:[0-9a-f]{2})*$/.test(text) || (length !== undefined && text.length !== length * 2)) {
    const expected = length === undefined ? '' : ` of ${length} bytes`;
    throw new EncodingError(`Lower-case hexadecimal${expected} was expected.`);
  }
  return hexToBytes(text);
}
