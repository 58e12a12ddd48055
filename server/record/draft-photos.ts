import { Conflict } from '#domain/errors.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** A numbered mark on a photo; `x` and `y` in hundredths of a percent of the upright picture. */
export interface DraftPin {
  number: number;
  x: number;
  y: number;
  kind: 'damage' | 'remark';
  label: string;
  note: string;
}

/** A photo of a draft with both hashes that are sealed. */
export interface DraftPhoto {
  linkId: string;
  photoId: string;
  n: number;
  visibility: 'shared' | 'bench';
  caption: string | null;
  /** Clock time with its offset where the camera gave one. */
  taken: string | null;
  originalSha256: Buffer;
  publishedSha256: Buffer;
  pins: DraftPin[];
}

interface Row {
  id: string;
  photo_id: string;
  number: number;
  visibility: 'shared' | 'bench';
  caption: string | null;
  state: 'waiting' | 'ready' | 'failed';
  sha256: Buffer;
  published: Buffer | null;
  taken_clock: string | null;
  taken_offset: string | null;
}

/** The long edge of the published copy, px. */
export const PUBLISHED_EDGE = 2048;

function readyRow(row: Row): Row & { published: Buffer } {
  if (row.state === 'failed') {
    throw new Conflict(
      `Photo ${row.number} could not be read. Take it off this entry, then seal it.`,
    );
  }
  if (row.state === 'waiting' || !row.published) {
    throw new Conflict(
      `Photo ${row.number} is still being prepared. Wait a moment, then seal the entry.`,
    );
  }
  return { ...row, published: row.published };
}

/**
 * The photos of a draft by number. In an entry for the bench only every photo is for the bench only.
 * @throws Conflict naming the first photo that is not ready to be sealed
 */
export async function draftPhotos(
  tx: Transaction,
  entryId: string,
  visibility: 'shared' | 'bench',
): Promise<DraftPhoto[]> {
  const rows = await select<Row>(
    `SELECT l.id, l.photo_id, f.number, l.visibility, l.caption, f.state, f.sha256, c.sha256 AS published,
            f.taken_clock, f.taken_offset
     FROM entry_photos l
     JOIN photos f ON f.id = l.photo_id
     LEFT JOIN photo_copies c ON c.photo_id = f.id AND c.edge = ${PUBLISHED_EDGE}
     WHERE l.entry_id = ? ORDER BY f.number`,
    [entryId],
    tx,
  );
  const pins = await select<DraftPin & { link: string }>(
    `SELECT p.entry_photo_id AS link, p.number, p.x, p.y, p.kind, p.label, p.note
     FROM pins p JOIN entry_photos l ON l.id = p.entry_photo_id
     WHERE l.entry_id = ? ORDER BY p.number`,
    [entryId],
    tx,
  );
  return rows.map(readyRow).map((row) => ({
    linkId: row.id,
    photoId: row.photo_id,
    n: row.number,
    visibility: visibility === 'bench' ? 'bench' : row.visibility,
    caption: row.caption,
    taken: row.taken_clock && row.taken_clock + (row.taken_offset ?? ''),
    originalSha256: row.sha256,
    publishedSha256: row.published,
    pins: pins.filter(({ link }) => link === row.id),
  }));
}
