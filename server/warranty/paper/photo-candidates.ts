import { readSealedShown } from '#server/record/read-sealed.ts';
import { select } from '#server/db/sql.ts';
import type { Candidate } from './pick-pair.ts';

/** A photo that may stand on the paper, with where it is kept and when it was sealed. */
export interface SealedPhoto extends Candidate {
  phase: 'before' | 'during' | 'after';
  objectKey: string;
  at: Date;
}

/** Long edge in px of the copy that is printed: at 74 mm wide more than 300 dots an inch. */
const PRINTED_EDGE = 960;

interface Row {
  leaf_index: string;
  phase: SealedPhoto['phase'];
  number: number;
  object_key: string;
  at: Date;
}

/** The sealed photos of a case that the owner may see, in the order they were sealed. */
export async function photoCandidates(caseId: string): Promise<SealedPhoto[]> {
  const rows = await select<Row>(
    `SELECT e.leaf_index, e.phase, f.number, c.object_key, COALESCE(e.occurred_at, e.sealed_at) AS at
     FROM entries e
     JOIN entry_photos l ON l.entry_id = e.id AND l.visibility = 'shared'
     JOIN photos f ON f.id = l.photo_id
     JOIN photo_copies c ON c.photo_id = f.id AND c.edge = ?
     WHERE e.case_id = ? AND e.visibility = 'shared' AND e.leaf_index IS NOT NULL
     ORDER BY e.leaf_index, f.number`,
    [PRINTED_EDGE, caseId],
  );
  const sealed = await readSealedShown(rows.map((row) => Number(row.leaf_index)));
  return rows.flatMap(({ leaf_index, phase, number, object_key, at }) => {
    const words = sealed.get(Number(leaf_index))?.body?.photos.find(({ n }) => n === number);
    if (!words) return [];
    const damage = words.pins.some(({ kind }) => kind === 'damage');
    return [{ n: number, caption: words.caption, damage, phase, objectKey: object_key, at }];
  });
}
