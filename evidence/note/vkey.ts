import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { concat } from '#evidence/bytes/concat.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { KeyError } from '#evidence/errors.ts';
import { isKeyName } from '#evidence/note/key-name.ts';

/** Signature types of C2SP signed-note: plain Ed25519, and a witness's cosignature with its time. */
export const LOG_TYPE = 1;
export const WITNESS_TYPE = 4;
export type NoteKeyType = typeof LOG_TYPE | typeof WITNESS_TYPE;

/** A key as notes know it; `id` is the four bytes of a signature line, as 8 hex. */
export type NoteKey = { name: string; type: NoteKeyType; publicKey: Uint8Array; id: string };

/**
 * The four-byte id of a note's key, as 8 hex (C2SP signed-note, "Signatures"):
 * SHA-256(name ‖ 0A ‖ type ‖ public key), cut.
 */
export function noteKeyId(name: string, type: NoteKeyType, publicKey: Uint8Array): string {
  return toHex(sha256(toUtf8(name), Uint8Array.of(10, type), publicKey).subarray(0, 4));
}

/**
 * A key as text: `<name>+<id>+<base64 of type and public key>`.
 * @throws KeyError for a name notes cannot carry or a key that is not 32 bytes
 */
export function encodeVkey(key: Omit<NoteKey, 'id'>): string {
  const { name, type, publicKey } = key;
  if (!isKeyName(name)) throw new KeyError('A key’s name has no spaces and no plus sign.');
  if (publicKey.length !== 32) throw new KeyError('An Ed25519 public key is 32 bytes long.');
  const encoded = toBase64(concat(Uint8Array.of(type), publicKey));
  return `${name}+${noteKeyId(name, type, publicKey)}+${encoded}`;
}

/**
 * Reads a key from its text.
 * @throws KeyError when the text is malformed, of another type, or its id is not that of its key
 */
export function decodeVkey(text: string): NoteKey {
  const match = /^([^+]+)\+([0-9a-f]{8})\+([A-Za-z0-9+/=]+)$/.exec(text);
  if (!match) throw new KeyError('This is not a note’s key.');
  const [, name, id, encoded] = match as unknown as [string, string, string, string];
  const [type, ...publicKey] = decode(encoded);
  if ((type !== LOG_TYPE && type !== WITNESS_TYPE) || publicKey.length !== 32) {
    throw new KeyError('This key is of a type that is not used here.');
  }
  const key: NoteKey = { name, type, publicKey: Uint8Array.from(publicKey), id };
  if (encodeVkey(key) !== text) throw new KeyError('The id of this key is not that of its bytes.');
  return key;
}

function decode(encoded: string): Uint8Array {
  try {
    return fromBase64(encoded);
  } catch (cause) {
    throw new KeyError('This is not a note’s key.', { cause });
  }
}
