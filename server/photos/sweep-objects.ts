import { select } from '#server/db/sql.ts';
import { log } from '#server/log.ts';
import { listObjects, removeObject } from '#server/storage/objects.ts';

/** An upload or a job that takes longer than this has ended, however it ended. */
const OLD_MS = 60 * 60 * 1000;

const SHELVES = [
  { shelf: 'originals', known: 'SELECT object_key AS `key` FROM photos WHERE object_key IN (?)' },
  {
    shelf: 'copies',
    known: 'SELECT object_key AS `key` FROM photo_copies WHERE object_key IN (?)',
  },
  { shelf: 'papers', known: 'SELECT object_key AS `key` FROM papers WHERE object_key IN (?)' },
] as const;

/**
 * Removes originals, copies and papers that no row knows and that are older than an hour: what a
 * crash left between storing and writing down. Returns how many. Throws Unavailable.
 */
export async function sweepObjects({ now = new Date() } = {}): Promise<number> {
  let swept = 0;
  for (const { shelf, known } of SHELVES) {
    for await (const page of listObjects(shelf)) {
      const old = page
        .filter(({ keptAt }) => now.getTime() - keptAt.getTime() > OLD_MS)
        .map(({ key }) => key);
      if (old.length === 0) continue;
      const rows = await select<{ key: string }>(known, [old]);
      const kept = new Set(rows.map(({ key }) => key));
      for (const key of old.filter((one) => !kept.has(one))) {
        await removeObject(key);
        swept += 1;
      }
    }
  }
  if (swept > 0) log.info({ swept }, 'objects without a row were removed');
  return swept;
}
