import type { Visibility } from '#domain/entry-draft.ts';
import { NotFound } from '#domain/errors.ts';
import { parseCaseNumber } from '#domain/case-number.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { caseScope } from '#server/cases/case-scope.ts';
import { select } from '#server/db/sql.ts';
import { photoScope } from './photo-scope.ts';

/** A photo of a case, on an entry or on none. */
export interface CasePhoto {
  id: string;
  n: number;
  /** Of the original, in hex; null for a customer, who is not given originals. */
  sha256: string | null;
  state: 'waiting' | 'ready' | 'failed';
  failedBecause: string | null;
  /** Px, upright once ready. */
  width: number;
  height: number;
  /** ThumbHash, base64. */
  placeholder: string | null;
  receivedAt: Date;
  /** The camera's clock and zone as it gave them, and the instant where both are known. */
  takenClock: string | null;
  takenOffset: string | null;
  takenAt: Date | null;
  /** Who added it; null for a customer. */
  addedBy: string | null;
  /** The entries it is on, as far as the viewer may see them. */
  links: { entryId: string; visibility: Visibility; sealed: boolean }[];
}

interface Row extends Omit<CasePhoto, 'sha256' | 'placeholder' | 'links'> {
  sha256: Buffer;
  placeholder: Buffer | null;
}

interface LinkRow {
  photoId: string;
  entryId: string;
  visibility: Visibility;
  sealed: 0 | 1;
}

const linksOf = (viewer: Viewer, photoIds: string[]) =>
  select<LinkRow>(
    `SELECT l.photo_id AS photoId, l.entry_id AS entryId, l.visibility,
            e.leaf_index IS NOT NULL AS sealed
     FROM entry_photos l JOIN entries e ON e.id = l.entry_id
     WHERE l.photo_id IN (?)
       ${viewer.kind === 'staff' ? '' : "AND l.visibility = 'shared' AND e.visibility = 'shared' AND e.leaf_index IS NOT NULL"}
     ORDER BY e.written_at, e.id`,
    [photoIds],
  );

/**
 * Every photo of a case that the viewer may see, by number, also those on no entry. Three queries.
 * Throws NotFound for a number that is none, unknown, or not in the viewer's scope.
 */
export async function listCasePhotos(
  viewer: Viewer,
  { caseNumber }: { caseNumber: string },
): Promise<CasePhoto[]> {
  demand(viewer, 'see cases', { own: true });
  const number = parseCaseNumber(caseNumber);
  const scope = caseScope(viewer);
  const [found] = number
    ? await select<{ id: string }>(
        `SELECT c.id FROM cases c WHERE c.year = :year AND c.ordinal = :ordinal AND ${scope.sql}`,
        { ...scope.params, ...number },
      )
    : [];
  if (!found) throw new NotFound('No case has this number. Check it on the tag.');

  const staff = viewer.kind === 'staff';
  const sight = photoScope(viewer);
  const rows = await select<Row>(
    `SELECT f.id, f.number AS n, f.sha256, f.state, f.failed_because AS failedBecause, f.width,
            f.height, f.placeholder, f.received_at AS receivedAt, f.taken_clock AS takenClock,
            f.taken_offset AS takenOffset, f.taken_at AS takenAt, p.name AS addedBy
     FROM photos f JOIN cases c ON c.id = f.case_id JOIN people p ON p.id = f.uploaded_by
     WHERE f.case_id = :caseId AND ${sight.sql} ORDER BY f.number`,
    { ...sight.params, caseId: found.id },
  );
  const links = await linksOf(
    viewer,
    rows.map(({ id }) => id),
  );
  return rows.map((row) => ({
    ...row,
    sha256: staff ? row.sha256.toString('hex') : null,
    addedBy: staff ? row.addedBy : null,
    placeholder: row.placeholder && row.placeholder.toString('base64'),
    links: links
      .filter(({ photoId }) => photoId === row.id)
      .map(({ entryId, visibility, sealed }) => ({ entryId, visibility, sealed: sealed === 1 })),
  }));
}
