import { select } from '#server/db/sql.ts';

/** A small picture of a case. */
export interface CaseThumb {
  photoId: string;
  /** Upright size of the original, px. */
  width: number;
  height: number;
  /** ThumbHash, base64. */
  placeholder: string | null;
}

interface Row extends Omit<CaseThumb, 'placeholder'> {
  caseId: string;
  placeholder: Buffer | null;
}

const SEALED_AND_SHARED = `AND EXISTS (
  SELECT 1 FROM entry_photos l JOIN entries e ON e.id = l.entry_id
  WHERE l.photo_id = f.id AND l.visibility = 'shared'
    AND e.visibility = 'shared' AND e.leaf_index IS NOT NULL)`;

/**
 * The first photo of each case that is ready, by case id: of all, or only of those the owner may see.
 * Unscoped: the caller has already found the cases within the viewer's scope.
 */
export async function unsafeFirstPhotos(
  caseIds: string[],
  { ownersOnly }: { ownersOnly: boolean },
): Promise<Map<string, CaseThumb>> {
  const rows = await select<Row>(
    `SELECT caseId, photoId, width, height, placeholder FROM (
       SELECT f.case_id AS caseId, f.id AS photoId, f.width, f.height, f.placeholder,
              ROW_NUMBER() OVER (PARTITION BY f.case_id ORDER BY f.number) AS place
       FROM photos f
       WHERE f.case_id IN (?) AND f.state = 'ready' ${ownersOnly ? SEALED_AND_SHARED : ''}
     ) ordered WHERE place = 1`,
    [caseIds],
  );
  return new Map(
    rows.map(({ caseId, placeholder, photoId, width, height }) => [
      caseId,
      { photoId, width, height, placeholder: placeholder && placeholder.toString('base64') },
    ]),
  );
}
