import { currentKey } from './current-key.ts';
import { readKeyFile, type KeyUse } from './key-files.ts';

/** An Ed25519 key ready to sign: its id and the 32-byte seed of RFC 8032. */
export interface SigningKey {
  keyId: string;
  secretKey: Uint8Array;
}

/**
 * The log's or the credentials' present key, with its private part read from the keys folder.
 * @throws Error with a sentence when the file is missing, open to others, or another key's
 */
export async function signingKey(use: Exclude<KeyUse, 'paper'>): Promise<SigningKey> {
  const { id } = await currentKey(use);
  const { d } = readKeyFile(use, id).privateKey.export({ format: 'jwk' });
  if (!d) throw new Error(`The ${use} key is no Ed25519 key.`);
  return { keyId: id, secretKey: new Uint8Array(Buffer.from(d, 'base64url')) };
}
