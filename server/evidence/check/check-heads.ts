import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { writeEntryBundle } from '#evidence/tiles/entry-bundle.ts';
import { entriesPath } from '#evidence/tiles/tile-path.ts';
import { select } from '#server/db/sql.ts';
import { readOwnNote } from '../compare-with-store.ts';
import { LAST_NOTE, noteKey, readLogObject } from '../log-store.ts';
import { readLogEntries } from '../read-log.ts';
import { sameBytes, type Differences } from './differences.ts';
import type { Tree } from './tree.ts';

/** A head as the database has it. */
export interface HeadRow {
  size: number;
  root: Buffer;
  note: Buffer | null;
  published: boolean;
}

/** Every head the database has, by size. */
export async function headRows(): Promise<HeadRow[]> {
  const rows = await select<{ size: string; root: Buffer; note: Buffer | null; at: Date | null }>(
    'SELECT size, root, note, published_at AS at FROM log_heads ORDER BY size',
  );
  return rows.map(({ size, root, note, at }) => ({
    size: Number(size),
    root,
    note,
    published: at !== null,
  }));
}

async function checkNote(
  note: Uint8Array,
  { what, size, root }: { what: string; size: number; root: Uint8Array | undefined },
  origin: string,
  found: Differences,
): Promise<void> {
  const read = await readOwnNote(note, origin);
  if (!read) return found.add(what, `head ${size}`, 'is not signed by this log');
  found.expect(read.size === size, what, `head ${size}`, 'is of another size');
  if (read.size !== size || !root) return;
  const how = `signs root ${toHex(read.root).slice(0, 8)}…, the entries make another`;
  found.expect(sameBytes(read.root, root), what, `head ${size}`, how);
}

async function checkHead(head: HeadRow, tree: Tree, origin: string, found: Differences) {
  const { size, root, note, published } = head;
  const which = `head ${size}`;
  found.seen('heads');
  const built = tree.roots.get(size);
  if (!found.expect(built !== undefined, 'log_heads.size', which, 'the log has fewer leaves'))
    return;
  found.expect(sameBytes(root, built), 'log_heads.root', which, 'is not the root of the entries');
  found.expect(published === (note !== null), 'log_heads.note', which, 'published without a note');
  if (!note) return;
  await checkNote(note, { what: 'log_heads.note', size, root: built }, origin, found);
  const stored = await readLogObject(noteKey(size));
  found.expect(sameBytes(stored, note), `store ${noteKey(size)}`, which, 'is not the head’s note');
}

async function checkBundles(size: number, found: Differences): Promise<void> {
  for (let n = 0; n * 256 < size; n += 1) {
    const width = Math.min(256, size - n * 256);
    const key = `log/${entriesPath(n, width)}`;
    const bundle = writeEntryBundle(await readLogEntries(n * 256, width));
    const stored = await readLogObject(key);
    found.expect(sameBytes(stored, bundle), `store ${key}`, `entries ${n * 256} on`, 'differ');
    found.seen('entry bundles');
  }
}

/**
 * Holds the heads against the rebuilt tree, and the database against what the store keeps outside of
 * it: the last note, every note, the entries.
 */
export async function checkHeads(
  heads: HeadRow[],
  tree: Tree,
  origin: string,
  found: Differences,
): Promise<void> {
  for (const head of heads) await checkHead(head, tree, origin, found);
  const newest = heads.findLast(({ published }) => published);
  const last = await readLogObject(LAST_NOTE);
  if (!last) {
    found.expect(!newest, `store ${LAST_NOTE}`, 'the last head', 'is missing');
    return;
  }
  const read = await readOwnNote(last, origin);
  if (!read) return found.add(`store ${LAST_NOTE}`, 'the last head', 'is not signed by this log');
  const root = tree.roots.get(read.size);
  const behind = `the store’s head has ${read.size} entries, the database ${tree.size}`;
  if (!found.expect(read.size <= tree.size, 'the database', 'the whole log', behind)) return;
  if (root) {
    await checkNote(last, { what: `store ${LAST_NOTE}`, size: read.size, root }, origin, found);
  }
  const same = !newest?.note || sameBytes(last, toUtf8(newest.note.toString('utf8')));
  found.expect(same, `store ${LAST_NOTE}`, 'the last head', 'is not the newest published one');
  await checkBundles(read.size, found);
}
