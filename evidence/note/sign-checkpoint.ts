import { checkpointText, type Head } from '#evidence/note/checkpoint-text.ts';
import { signNote } from '#evidence/note/sign-note.ts';

/**
 * A log's checkpoint: its head as a note signed by the log's own key, whose name is the origin.
 * @param secretKey the log key's 32-byte secret
 * @throws NoteError when the head has no checkpoint text
 */
export function signCheckpoint(head: Head, secretKey: Uint8Array): string {
  return signNote(checkpointText(head), { name: head.origin, secretKey });
}
