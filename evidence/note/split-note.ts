import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { NoteError } from '#evidence/errors.ts';
import { NOTE_BYTES } from '#evidence/limits.ts';
import { readSignatureLine, type SignatureLine } from '#evidence/note/signature-line.ts';

/**
 * Takes a signed note apart without checking any signature: its text with the final newline, and
 * its signature lines.
 * @throws NoteError when it is too long, not UTF-8, holds a control character or a line that is no
 *   signature, or has none
 */
export function splitNote(note: string): { text: string; lines: SignatureLine[] } {
  // eslint-disable-next-line no-control-regex -- control characters are what is looked for
  if (/[\u0000-\u0009\u000b-\u001f]/.test(note)) {
    throw new NoteError('A note holds no control characters.');
  }
  if (note.length > NOTE_BYTES || toUtf8(note).length > NOTE_BYTES) {
    throw new NoteError(`A note is at most ${NOTE_BYTES} bytes long.`);
  }
  const gap = note.lastIndexOf('\n\n');
  const tail = note.slice(gap + 2);
  if (gap < 0 || !tail.endsWith('\n')) throw new NoteError('This is not a signed note.');
  const lines = tail.slice(0, -1).split('\n').map(readSignatureLine);
  return { text: note.slice(0, gap + 1), lines };
}
