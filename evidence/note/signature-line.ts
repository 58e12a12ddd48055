import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { concat } from '#evidence/bytes/concat.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { NoteError } from '#evidence/errors.ts';
import { isKeyName } from '#evidence/note/key-name.ts';

/** One signature line taken apart; `keyId` is 8 hex, `signature` what follows it. */
export type SignatureLine = { name: string; keyId: string; signature: Uint8Array };

/** `— <name> <base64 of key id and signature>` with its newline. */
export function signatureLine({ name, keyId, signature }: SignatureLine): string {
  return `— ${name} ${toBase64(concat(fromHex(keyId, 4), signature))}\n`;
}

/**
 * Reads a line without its newline.
 * @throws NoteError when it is not a signature line in its one form
 */
export function readSignatureLine(line: string): SignatureLine {
  const [dash, name = '', encoded = '', ...more] = line.split(' ');
  if (dash !== '—' || !isKeyName(name) || more.length > 0) throw malformed();
  let bytes: Uint8Array;
  try {
    bytes = fromBase64(encoded);
  } catch {
    throw malformed();
  }
  if (bytes.length < 5) throw malformed();
  return { name, keyId: toHex(bytes.subarray(0, 4)), signature: bytes.slice(4) };
}

function malformed(): NoteError {
  return new NoteError('This note has a line that is not a signature.');
}
