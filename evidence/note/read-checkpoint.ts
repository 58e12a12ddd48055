import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { NoteError } from '#evidence/errors.ts';
import { readCheckpointText, type Head } from '#evidence/note/checkpoint-text.ts';
import { readNote } from '#evidence/note/read-note.ts';
import { signatureLine } from '#evidence/note/signature-line.ts';

/**
 * A checkpoint whose own signatures were checked.
 * `signers` are the vkeys of the log that signed it; `stamped` the bytes a time-stamp covers, from
 * the first to the end of the log's own lines, so that later cosignatures change nothing.
 */
export type Checkpoint = Head & { note: string; signers: string[]; stamped: Uint8Array };

/**
 * Reads a checkpoint of one log. The log's own lines are those that bear its origin as their name;
 * they come first, at most one for each of its keys.
 * @param log its origin and the vkeys of its log keys
 * @throws NoteError when the note is malformed or unsigned, of another log, has an own line of a
 *   key not given, or own lines out of place or twice
 */
export function readCheckpoint(
  note: string,
  log: { origin: string; vkeys: readonly string[] },
): Checkpoint {
  const { text, signatures } = readNote(note, log.vkeys);
  const head = readCheckpointText(text);
  if (head.origin !== log.origin) throw new NoteError('This checkpoint is of another log.');

  const own = signatures.filter(({ name }) => name === log.origin);
  const signers = own.map(({ vkey }) => vkey);
  if (!signers.every((vkey) => vkey !== null)) {
    throw new NoteError('This checkpoint bears a signature of a key its log does not list.');
  }
  if (new Set(signers).size !== signers.length) {
    throw new NoteError('This checkpoint bears two signatures of one key of its log.');
  }
  if (own.length === 0 || own.some((line, at) => line !== signatures[at])) {
    throw new NoteError('A log’s own signatures come first on its checkpoint.');
  }
  const stamped = toUtf8(`${text}\n${own.map(signatureLine).join('')}`);
  return { ...head, note, signers, stamped };
}
