import { pathToFileURL } from 'node:url';
import type { KeyShown, LogStartShown } from '#evidence/chain/log-shown.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { closeDatabase } from '#server/db/connection.ts';
import { closeStore } from '#server/storage/client.ts';
import { Chains } from './check/chains.ts';
import { checkFiles } from './check/check-files.ts';
import { checkHeads, headRows } from './check/check-heads.ts';
import { checkKeys, type KeyLeaf } from './check/check-keys.ts';
import { checkLeaf } from './check/check-leaf.ts';
import { checkState } from './check/check-state.ts';
import { checkTimeline } from './check/check-timeline.ts';
import { checkWarranties } from './check/check-warranties.ts';
import { Differences } from './check/differences.ts';
import { leafRows } from './check/leaf-rows.ts';
import { SeenVisibility } from './check/seen-visibility.ts';
import { Tree } from './check/tree.ts';
import { readLogObject, LAST_NOTE } from './log-store.ts';
import { readLogState } from './log-state.ts';
import { readOwnNote } from './compare-with-store.ts';

const AT_ONCE = 500;

async function wantedSizes(origin: string): Promise<Set<number>> {
  const heads = await headRows();
  const last = await readLogObject(LAST_NOTE);
  const stored = last && (await readOwnNote(last, origin));
  return new Set([...heads.map(({ size }) => size), ...(stored ? [stored.size] : [])]);
}

/**
 * Rebuilds the witness log from what is stored, and compares every leaf, header, part, photo, node,
 * head, key, warranty, paper and file with it, and the database with the store's last note.
 * @returns what was looked at, and everything that differs, by name
 * @throws Unavailable while the store is silent
 */
export async function checkLog(): Promise<Differences> {
  const found = new Differences();
  const { origin } = await readLogState();
  const tree = new Tree(found, await wantedSizes(origin));
  const chains = new Chains(found);
  const seen = new SeenVisibility();
  const keys: KeyLeaf[] = [];
  let start: LogStartShown | undefined;
  for (;;) {
    const rows = await leafRows(tree.size, tree.size + AT_ONCE);
    if (rows.length === 0) break;
    for (const row of rows) {
      if (row.leafIndex !== tree.size) {
        found.add('log_leaves.leaf_index', `leaf ${tree.size}`, 'is missing');
        return found;
      }
      found.seen('leaves');
      tree.add(leafHash(row.entry));
      const leaf = checkLeaf(row, found);
      if (!leaf) continue;
      chains.next(row.leafIndex, leaf);
      seen.next(row.leafIndex, leaf.commitment, leaf.header, leaf.shown);
      if (leaf.header.kind === 'log-start') start = leaf.shown as LogStartShown | undefined;
      if (leaf.header.kind === 'key' && leaf.shown) {
        keys.push({ leafIndex: row.leafIndex, shown: leaf.shown as KeyShown });
      }
    }
    await tree.compare();
  }
  await tree.end();
  const { lastRecordedAt } = chains.end();
  await checkState(found, { size: tree.size, lastRecordedAt, start });
  await checkKeys(keys, found);
  await checkHeads(await headRows(), tree, origin, found);
  for (let from = 0; from < tree.size; from += AT_ONCE) {
    await checkTimeline(from, from + AT_ONCE, seen, found);
  }
  await checkWarranties(found);
  await checkFiles(found);
  return found;
}

/** The answer in words, one difference to a line. */
export function logReport({ counts, list }: Differences): string {
  const looked = Object.entries(counts)
    .map(([things, count]) => `${count} ${things}`)
    .join(', ');
  const lines = list.map(({ what, which, how }) => `${what} (${which}): ${how}.`);
  const verdict = list.length === 0 ? 'All agrees.' : `${list.length} things differ:`;
  return [`Looked at ${looked}.`, verdict, ...lines].join('\n');
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  const found = await checkLog();
  process.stdout.write(`${logReport(found)}\n`);
  await closeDatabase();
  closeStore();
  process.exitCode = found.list.length === 0 ? 0 : 1;
}
