import { createHash } from 'node:crypto';
import { select } from '#server/db/sql.ts';
import { getStream } from '#server/storage/objects.ts';
import type { Differences } from './differences.ts';

interface FileRow {
  what: string;
  which: string;
  object_key: string;
  sha256: Buffer;
}

// Originals, published copies and papers: what a leaf commits to. Smaller copies are made from them.
const FILES = `
  SELECT 'store original' AS what, CONCAT('photo ', f.id) AS which, f.object_key, f.sha256
  FROM photos f WHERE EXISTS (
    SELECT 1 FROM entry_photos l JOIN entries e ON e.id = l.entry_id
    WHERE l.photo_id = f.id AND e.leaf_index IS NOT NULL)
  UNION ALL
  SELECT 'store published copy', CONCAT('photo ', c.photo_id), c.object_key, c.sha256
  FROM photo_copies c WHERE c.edge = 2048 AND EXISTS (
    SELECT 1 FROM entry_photos l JOIN entries e ON e.id = l.entry_id
    WHERE l.photo_id = c.photo_id AND e.leaf_index IS NOT NULL)
  UNION ALL
  SELECT 'store paper', CONCAT('paper ', p.id), p.object_key, p.sha256
  FROM papers p WHERE p.leaf_index IS NOT NULL`;

async function hashOf(key: string): Promise<Buffer | undefined> {
  const stream = await getStream(key);
  if (!stream) return undefined;
  const hash = createHash('sha256');
  for await (const chunk of stream) hash.update(chunk as Buffer);
  return hash.digest();
}

/** Reads every sealed file in the store and holds its SHA-256 against the database's. */
export async function checkFiles(found: Differences): Promise<void> {
  for (const { what, which, object_key, sha256 } of await select<FileRow>(FILES)) {
    found.seen('files');
    const hash = await hashOf(object_key);
    if (!hash) found.add(what, which, 'is not in the store');
    else found.expect(hash.equals(sha256), what, which, 'is another file than the one sealed');
  }
}
