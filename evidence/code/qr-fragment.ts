import { fromBase64url, toBase64url } from '#evidence/bytes/base64url.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { CodeError } from '#evidence/errors.ts';

/**
 * What the QR of a paper carries behind the address and code. A browser never sends it, so no
 * server learns which paper somebody holds against the record.
 * @param sealValue the warranty's leaf hash, 32 bytes, of which 16 go in
 * @param logKeyId 32 hex
 * @returns `#1.` and two groups of 22 signs
 * @throws EncodingError when either has another length
 */
export function qrFragment(sealValue: Uint8Array, logKeyId: string): string {
  fromHex(toHex(sealValue), 32);
  return `#1.${toBase64url(sealValue.subarray(0, 16))}.${toBase64url(fromHex(logKeyId, 16))}`;
}

/**
 * Reads a QR's fragment, with or without the sign #.
 * @returns the first 16 bytes of the seal value and the log key id as 32 hex
 * @throws CodeError with a sentence for whoever scanned it
 */
export function readQrFragment(fragment: string): { seal16: Uint8Array; logKeyId: string } {
  const [form, seal = '', key = '', ...more] = fragment.replace(/^#/, '').split('.');
  if (form !== '1' || more.length > 0) throw unreadable();
  try {
    const [seal16, keyBytes] = [fromBase64url(seal), fromBase64url(key)];
    if (seal16.length === 16 && keyBytes.length === 16) {
      return { seal16, logKeyId: toHex(keyBytes) };
    }
  } catch {
    // Said below, in one way for all.
  }
  throw unreadable();
}

function unreadable(): CodeError {
  return new CodeError('This QR code was not read whole. Scan it again, or type the code.');
}
