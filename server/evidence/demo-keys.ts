import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { env, isLoopback } from '#server/env.ts';

const note = () => join(env().KEYS_DIR, 'DEMO-KEYS.txt');

/** Leaves a note beside keys that were made for a demonstration. */
export function noteDemoKeys(): void {
  mkdirSync(env().KEYS_DIR, { recursive: true, mode: 0o700 });
  writeFileSync(note(), 'Keys made for a demonstration. They sign nothing for other people.\n');
}

/**
 * Keys made for a demonstration lie about on disks; nobody else may be asked to trust them.
 * @throws Error with a sentence when PUBLIC_URL can be reached by others and the keys are demo keys
 */
export function refuseDemoKeysInPublic(publicUrl = env().PUBLIC_URL): void {
  if (isLoopback(publicUrl) || !existsSync(note())) return;
  throw new Error(
    `The keys in ${env().KEYS_DIR} were made for a demonstration and PUBLIC_URL can be reached by others. ` +
      'Set KEYS_DIR to an empty folder and DATABASE_URL to a new database.',
  );
}
