import { v7 } from 'uuid';
import type { PhotoLink, Visibility } from '#domain/entry-draft.ts';
import { run, select, type Transaction } from '#server/db/sql.ts';

/** The photos of one draft as its form sends them. */
export interface LinksToKeep {
  caseId: string;
  entryId: string;
  visibility: Visibility;
  photos: readonly PhotoLink[];
  takeOff: readonly string[];
}

async function photosOfCase(tx: Transaction, caseId: string, ids: string[]): Promise<Set<string>> {
  const rows = await select<{ id: string }>(
    'SELECT id FROM photos WHERE case_id = ? AND id IN (?)',
    [caseId, ids],
    tx,
  );
  return new Set(rows.map(({ id }) => id));
}

/**
 * Links photos of the case to a draft with captions and visibility, and takes others off; the case row
 * is locked. Photos that are linked but not named are left alone: they may have come up meanwhile.
 * Returns the photos that are not up yet. In an entry for the bench only every photo is for the bench.
 */
export async function keepLinks(
  tx: Transaction,
  { caseId, entryId, visibility, photos, takeOff }: LinksToKeep,
): Promise<PhotoLink[]> {
  const wanted = photos
    .filter(({ photoId }) => !takeOff.includes(photoId))
    .map((link) => ({
      ...link,
      visibility: visibility === 'bench' ? visibility : link.visibility,
    }));
  if (takeOff.length > 0)
    await run(
      'DELETE FROM entry_photos WHERE entry_id = ? AND photo_id IN (?)',
      [entryId, [...takeOff]],
      tx,
    );
  if (wanted.length === 0) return [];
  const ids = wanted.map(({ photoId }) => photoId);
  const up = await photosOfCase(tx, caseId, ids);
  const links = wanted.filter(({ photoId }) => up.has(photoId));
  if (links.length > 0)
    await run(
      `INSERT INTO entry_photos (id, entry_id, photo_id, visibility, caption)
       VALUES ${links.map(() => '(?, ?, ?, ?, ?)').join(', ')}
       ON DUPLICATE KEY UPDATE visibility = VALUES(visibility), caption = VALUES(caption)`,
      links.flatMap((link) => [v7(), entryId, link.photoId, link.visibility, link.caption]),
      tx,
    );
  return wanted.filter(({ photoId }) => !up.has(photoId));
}
