import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { EncodingError } from '#evidence/errors.ts';

/** Base64url without padding (RFC 4648 §5, as JWS uses it) of the bytes. */
export function toBase64url(bytes: Uint8Array): string {
  return toBase64(bytes).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '');
}

/**
 * Bytes of unpadded base64url in its one canonical form.
 * @throws EncodingError for padding, other signs or set bits beyond the last byte
 */
export function fromBase64url(text: string): Uint8Array {
  if (!/^[A-Za-z0-9_-]*$/.test(text) || text.length % 4 === 1) {
    throw new EncodingError('This is not base64url.');
  }
  const padding = '='.repeat((4 - (text.length % 4)) % 4);
  return fromBase64(text.replaceAll('-', '+').replaceAll('_', '/') + padding);
}
