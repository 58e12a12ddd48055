import { concat } from '#evidence/bytes/concat.ts';
import { NoteError } from '#evidence/errors.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { cosignedText } from '#evidence/note/cosigned-text.ts';
import type { NoteSigner } from '#evidence/note/sign-note.ts';
import { signatureLine } from '#evidence/note/signature-line.ts';
import { splitNote } from '#evidence/note/split-note.ts';
import { noteKeyId, WITNESS_TYPE } from '#evidence/note/vkey.ts';

/**
 * Adds a witness's cosignature (C2SP tlog-cosignature, Ed25519) to another log's checkpoint. The
 * caller has checked the log's signature and the consistency with what was cosigned before.
 * @param signer the witness key; its name is the witness's origin followed by `/witness`
 * @param seconds when, in seconds since 1970
 * @returns the note with the line added at its end
 * @throws NoteError when the note is malformed or the time is no whole number from 0
 */
export function cosignCheckpoint(note: string, signer: NoteSigner, seconds: number): string {
  if (!Number.isSafeInteger(seconds) || seconds < 0) {
    throw new NoteError('The time of a cosignature is a whole number of seconds.');
  }
  const { name, secretKey } = signer;
  const time = new Uint8Array(8);
  new DataView(time.buffer).setBigUint64(0, BigInt(seconds));
  const { text } = splitNote(note);
  const signature = concat(time, signEd25519(cosignedText(BigInt(seconds), text), secretKey));
  const keyId = noteKeyId(name, WITNESS_TYPE, ed25519PublicKey(secretKey));
  return note + signatureLine({ name, keyId, signature });
}
