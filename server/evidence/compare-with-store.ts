import { Conflict } from '#domain/errors.ts';
import { equal } from '#evidence/bytes/equal.ts';
import { fromUtf8 } from '#evidence/bytes/utf8.ts';
import { EvidenceError } from '#evidence/errors.ts';
import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { readCheckpoint } from '#evidence/note/read-checkpoint.ts';
import { log } from '#server/log.ts';
import { publicKeys } from './current-key.ts';
import { withNodes } from './log-nodes.ts';

const ASK = 'Nothing is signed until this is settled: run npm run log:check.';

/** Reads a note of this log; null when it is not one that a key of this log has signed. */
export async function readOwnNote(note: Uint8Array, origin: string) {
  const vkeys = (await publicKeys()).flatMap(({ use, vkey }) =>
    use === 'log' && vkey ? [vkey] : [],
  );
  try {
    return readCheckpoint(fromUtf8(note), { origin, vkeys });
  } catch (error) {
    if (error instanceof EvidenceError) return null;
    throw error;
  }
}

/**
 * Compares the database with the last note in the store, which is kept outside it: a database that
 * was restored or altered does not get a signature. Being ahead of the store is normal.
 * @param note the store's last note; undefined when it has none
 * @returns the size of the store's head, 0 when it has none
 * @throws Conflict with a sentence when the database is behind the store or different from it
 */
export async function compareWithStore(
  note: Uint8Array | undefined,
  { origin, size }: { origin: string; size: number },
): Promise<number> {
  if (!note) {
    if (size > 0) log.info('the store holds no head of the witness log yet');
    return 0;
  }
  const stored = await readOwnNote(note, origin);
  if (!stored) {
    throw new Conflict(
      `The store’s last head was not signed by this log: it belongs to another one, or was changed. ${ASK}`,
    );
  }
  if (stored.size > size) {
    throw new Conflict(
      `The database has ${size} log entries, the store’s last head has ${stored.size}: the database is behind, as after a restore. ${ASK}`,
    );
  }
  const root = await withNodes((read) => treeRoot(stored.size, read));
  if (!equal(root, stored.root)) {
    throw new Conflict(
      `The database’s first ${stored.size} log entries are not the ones whose head was signed before. ${ASK}`,
    );
  }
  return stored.size;
}
