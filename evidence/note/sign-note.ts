import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { NoteError } from '#evidence/errors.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { isKeyName } from '#evidence/note/key-name.ts';
import { signatureLine } from '#evidence/note/signature-line.ts';
import { LOG_TYPE, noteKeyId } from '#evidence/note/vkey.ts';

/** A key that signs notes: its name in them and the 32-byte secret. */
export type NoteSigner = { name: string; secretKey: Uint8Array };

/**
 * Signs a text as a note (C2SP signed-note, Ed25519): text, empty line, signature line.
 * @throws NoteError when the text does not end in a newline or holds a control character
 */
export function signNote(text: string, signer: NoteSigner): string {
  const { name, secretKey } = signer;
  // eslint-disable-next-line no-control-regex -- control characters are what is looked for
  if (!text.endsWith('\n') || /[\u0000-\u0009\u000b-\u001f]/.test(text)) {
    throw new NoteError('A note’s text ends in a newline and holds no other control character.');
  }
  if (!isKeyName(name)) throw new NoteError('A key’s name has no spaces and no plus sign.');
  const keyId = noteKeyId(name, LOG_TYPE, ed25519PublicKey(secretKey));
  const signature = signEd25519(toUtf8(text), secretKey);
  return `${text}\n${signatureLine({ name, keyId, signature })}`;
}
