import { EncodingError } from '#evidence/errors.ts';

const encoder = new TextEncoder();
// ignoreBOM keeps a byte order mark as text, so that decoding never drops a byte.
const decoder = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });

/**
 * UTF-8 bytes of a text.
 * @throws EncodingError when half of a surrogate pair stands alone: it has no UTF-8 form
 */
export function toUtf8(text: string): Uint8Array {
  const bytes = encoder.encode(text);
  if (/[\ud800-\udfff]/.test(text) && decoder.decode(bytes) !== text) {
    throw new EncodingError('The text holds half a character and cannot be written as UTF-8.');
  }
  return bytes;
}

/**
 * Text of UTF-8 bytes, every byte accounted for.
 * @throws EncodingError when the bytes are not well-formed UTF-8
 */
export function fromUtf8(bytes: Uint8Array): string {
  try {
    return decoder.decode(bytes);
  } catch {
    throw new EncodingError('These bytes are not UTF-8 text.');
  }
}
