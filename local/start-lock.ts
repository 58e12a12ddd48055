import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import { basename } from 'node:path';
import { Failure } from '../scripts/sentences.mjs';

/**
 * Holds the data folder for this process alone until it ends.
 * Throws a sentence when another start holds it; a file left by a killed one is taken over.
 */
export function holdStartLock(path: string): void {
  const holder = holderOf(path);
  if (holder !== undefined && holder !== process.pid)
    throw new Failure(
      `Witnessmark is already running here (process ${holder}). Use that one, or stop it first: kill ${holder}`,
    );
  writeFileSync(path, String(process.pid));
  process.once('exit', () => {
    if (holderOf(path) === process.pid) rmSync(path, { force: true });
  });
}

function holderOf(path: string): number | undefined {
  try {
    const pid = Number(readFileSync(path, 'utf8'));
    // Process numbers are used again: only one that runs the same program counts.
    const words = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    const program = basename(process.argv[1] ?? '');
    return words.some((word) => basename(word) === program) ? pid : undefined;
  } catch {
    return undefined;
  }
}
