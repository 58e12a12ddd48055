import { EncodingError } from '#evidence/errors.ts';

/** Padded base64 (RFC 4648 §4) of the bytes. */
export function toBase64(bytes: Uint8Array): string {
  let binary = '';
  // In pieces: one call with every byte as an argument overflows the stack for a large file.
  for (let at = 0; at < bytes.length; at += 8192) {
    binary += String.fromCharCode(...bytes.subarray(at, at + 8192));
  }
  return btoa(binary);
}

/**
 * Bytes of padded base64 in its one canonical form: no white space, no missing padding, and no
 * set bits in what the padding cuts off.
 * @throws EncodingError for any other text, even one that other decoders accept
 */
export function fromBase64(text: string): Uint8Array {
  let binary: string;
  try {
    binary = atob(text);
  } catch {
    throw new EncodingError('This is not base64.');
  }
  if (btoa(binary) !== text) throw new EncodingError('This is not base64 in its canonical form.');
  return Uint8Array.from(binary, (sign) => sign.charCodeAt(0));
}
