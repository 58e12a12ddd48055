import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { NoteError } from '#evidence/errors.ts';
import { isKeyName } from '#evidence/note/key-name.ts';

/** The head of a log: its name, how many leaves it has, and the root over them. */
export type Head = { origin: string; size: number; root: Uint8Array };

/**
 * The text of a checkpoint (C2SP tlog-checkpoint) without extension lines: origin, size and root,
 * a line each.
 * @throws NoteError when the head has no such text
 */
export function checkpointText({ origin, size, root }: Head): string {
  if (!isKeyName(origin) || !Number.isSafeInteger(size) || size < 0 || root.length !== 32) {
    throw new NoteError('A checkpoint names a log, a number of leaves and a root of 32 bytes.');
  }
  return `${origin}\n${size}\n${toBase64(root)}\n`;
}

/**
 * Reads the text of a checkpoint; the caller has checked who signed it.
 * @throws NoteError when it is not exactly the three lines, each in its one form
 */
export function readCheckpointText(text: string): Head {
  const [origin = '', decimal = '', encoded = ''] = text.split('\n');
  try {
    const head = { origin, size: Number(decimal), root: fromBase64(encoded) };
    // Writing it again catches leading zeros, extension lines and whatever else was not written so.
    if (checkpointText(head) === text) return head;
  } catch {
    // Said below, in one way for all.
  }
  throw new NoteError('This is not the text of a checkpoint.');
}
