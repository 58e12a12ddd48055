import { equal } from '#evidence/bytes/equal.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { signCheckpoint } from '#evidence/note/sign-checkpoint.ts';
import { withNamedLock } from '#server/db/named-lock.ts';
import { run } from '#server/db/sql.ts';
import { compareWithStore } from './compare-with-store.ts';
import { keepEntryBundles } from './keep-entry-bundles.ts';
import { withNodes } from './log-nodes.ts';
import { readLogState } from './log-state.ts';
import { keepLogObject, LAST_NOTE, noteKey, readLogObject } from './log-store.ts';
import { newestHead, type PublishedHead } from './newest-checkpoint.ts';
import { signingKey } from './signing-key.ts';

const LOCK_SECONDS = 60;
const TEXT = 'text/plain; charset=utf-8';

async function sign(now: Date): Promise<PublishedHead> {
  const { origin, size } = await readLogState();
  const root = Buffer.from(await withNodes((read) => treeRoot(size, read)));
  const stored = await readLogObject(LAST_NOTE);
  const storedSize = await compareWithStore(stored, { origin, size });

  const newest = await newestHead();
  const published = newest?.size === size && equal(newest.root, root);
  if (published && stored && equal(stored, toUtf8(newest.note))) return newest;

  await run('INSERT IGNORE INTO log_heads (size, root, note, made_at) VALUES (?, ?, NULL, ?)', [
    size,
    root,
    now,
  ]);
  const note = signCheckpoint({ origin, size, root }, (await signingKey('log')).secretKey);
  await keepEntryBundles(storedSize, size);
  await keepLogObject(noteKey(size), toUtf8(note), TEXT);
  await keepLogObject(LAST_NOTE, toUtf8(note), TEXT);
  await run(
    'UPDATE log_heads SET note = ?, published_at = COALESCE(published_at, ?) WHERE size = ? AND root = ?',
    [Buffer.from(toUtf8(note)), now, size, root],
  );
  return { size, root, note, madeAt: now };
}

/**
 * Signs the log's present head and publishes it, in this order: entries committed, head worked out
 * and compared with the last note in the store, signed, note and entries durable in the store, and
 * only then given to anyone. Does nothing when the head is published already.
 * @throws Unavailable while the store is silent (appending goes on, signing waits); Conflict when
 *   the database is behind the store or different from it
 */
export async function signHead({ now = new Date() }: { now?: Date } = {}): Promise<PublishedHead> {
  const head = await withNamedLock('sign-head', LOCK_SECONDS, () => sign(now));
  if (!head) throw new Error('Another process has been signing the head for a minute.');
  return head;
}
