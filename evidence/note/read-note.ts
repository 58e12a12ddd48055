import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { NoteError } from '#evidence/errors.ts';
import { verifyEd25519 } from '#evidence/key/verify-ed25519.ts';
import { cosignedText } from '#evidence/note/cosigned-text.ts';
import type { SignatureLine } from '#evidence/note/signature-line.ts';
import { splitNote } from '#evidence/note/split-note.ts';
import { decodeVkey, LOG_TYPE, type NoteKey } from '#evidence/note/vkey.ts';

/** A signature line; `vkey` is the given key it was checked with, null for a key not given. */
export type NoteSignature = SignatureLine & { vkey: string | null };
/** A note of which at least one signature was checked. */
export type Note = { text: string; signatures: NoteSignature[] };

/**
 * Reads a signed note (C2SP signed-note): every line of a given key is checked, lines of other
 * keys are passed over.
 * @param vkeys the keys to check with, as text
 * @throws NoteError when the note is malformed, a line of a given key does not hold, or none of
 *   the keys signed; KeyError for a malformed vkey
 */
export function readNote(note: string, vkeys: readonly string[]): Note {
  const keys = vkeys.map((vkey) => ({ vkey, key: decodeVkey(vkey) }));
  const { text, lines } = splitNote(note);
  const signatures = lines.map((line) => {
    const known = keys.find(({ key }) => key.name === line.name && key.id === line.keyId);
    if (known && !holds(line.signature, text, known.key)) {
      throw new NoteError('A signature on this note does not match its text.');
    }
    return { ...line, vkey: known?.vkey ?? null };
  });
  if (signatures.every(({ vkey }) => vkey === null)) {
    throw new NoteError('This note is signed by none of the keys it was held against.');
  }
  return { text, signatures };
}

function holds(signature: Uint8Array, text: string, key: NoteKey): boolean {
  if (key.type === LOG_TYPE) return verifyEd25519(signature, toUtf8(text), key.publicKey);
  if (signature.length !== 72) return false;
  const seconds = new DataView(signature.buffer, signature.byteOffset).getBigUint64(0);
  const inRange = seconds < 2n ** 63n;
  const message = cosignedText(seconds, text);
  return inRange && verifyEd25519(signature.subarray(8), message, key.publicKey);
}
