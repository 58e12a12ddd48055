import {
  createPrivateKey,
  createPublicKey,
  generateKeyPairSync,
  randomUUID,
  type KeyObject,
} from 'node:crypto';
import { closeSync, fsyncSync, mkdirSync, openSync, readdirSync, readFileSync } from 'node:fs';
import { renameSync, statSync, writeSync } from 'node:fs';
import { join } from 'node:path';
import { keyId } from '#evidence/key/key-id.ts';
import { env } from '#server/env.ts';

/** What the shop signs with a key of its own each: checkpoints, credentials and standing, papers. */
export type KeyUse = 'log' | 'credential' | 'paper';

/** A private key on this machine's disk, never in the database. */
export interface KeyFile {
  /** 32 hex digits. */
  id: string;
  privateKey: KeyObject;
  /** DER SubjectPublicKeyInfo. */
  spki: Buffer;
}

const nameOf = (use: KeyUse, id: string) => `${use}-${id}.pem`;

function keyFile(privateKey: KeyObject): KeyFile {
  const spki = createPublicKey(privateKey).export({ type: 'spki', format: 'der' });
  return { id: keyId(spki), privateKey, spki };
}

function refuseOpenFile(path: string): void {
  if ((statSync(path).mode & 0o077) !== 0) {
    throw new Error(`${path} can be read by others. Set its rights to 600: chmod 600 ${path}`);
  }
}

/** Ids of the keys of this use in the keys folder, in the order of their names. */
export function keyIdsOnDisk(use: KeyUse): string[] {
  mkdirSync(env().KEYS_DIR, { recursive: true, mode: 0o700 });
  const pattern = new RegExp(`^${use}-([0-9a-f]{32})\\.pem$`);
  return readdirSync(env().KEYS_DIR)
    .sort()
    .flatMap((name) => pattern.exec(name)?.[1] ?? []);
}

/**
 * Reads a private key by its id.
 * @throws Error with a sentence when the file is missing, open to others, or holds another key
 */
export function readKeyFile(use: KeyUse, id: string): KeyFile {
  const path = join(env().KEYS_DIR, nameOf(use, id));
  let pem: string;
  try {
    refuseOpenFile(path);
    pem = readFileSync(path, 'utf8');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
    throw new Error(`The private ${use} key is missing. Put ${path} back from its copy.`, {
      cause: error,
    });
  }
  const read = keyFile(createPrivateKey(pem));
  if (read.id !== id) throw new Error(`${path} holds another key. Put the right one back.`);
  return read;
}

/** Makes a key and keeps it on disk, readable by this account alone. Ed25519, for papers RSA-3072. */
export function makeKeyFile(use: KeyUse): KeyFile {
  const { privateKey } =
    use === 'paper'
      ? generateKeyPairSync('rsa', { modulusLength: 3072 })
      : generateKeyPairSync('ed25519');
  const made = keyFile(privateKey);
  const pem = privateKey.export({ type: 'pkcs8', format: 'pem' }).toString();
  const path = join(env().KEYS_DIR, nameOf(use, made.id));
  const draft = `${path}.${randomUUID()}`;
  const file = openSync(draft, 'wx', 0o600);
  try {
    writeSync(file, pem);
    fsyncSync(file);
  } finally {
    closeSync(file);
  }
  renameSync(draft, path);
  return made;
}
