import { EntryDraftSchema, type EntryDraft } from '#domain/entry-draft.ts';
import { Conflict, NotFound } from '#domain/errors.ts';
import type { Role } from '#domain/viewer.ts';
import { select, type Transaction } from '#server/db/sql.ts';
import { draftPhotos, type DraftPhoto } from './draft-photos.ts';

/** A draft with everything that is sealed with it. */
export interface DraftToSeal {
  id: string;
  kind: string;
  phase: 'before' | 'during' | 'after';
  visibility: 'shared' | 'bench';
  amendsId: string | null;
  occurredAt: Date | null;
  writtenBy: string | null;
  draft: EntryDraft;
  author: { name: string; role: Role; number: number } | null;
  rest: {
    product: string;
    startedAt: Date;
    clampsOffAt: Date | null;
    workedAt: Date | null;
    stringsAt: Date | null;
  } | null;
  photos: DraftPhoto[];
}

interface Row {
  id: string;
  kind: string;
  phase: DraftToSeal['phase'];
  visibility: DraftToSeal['visibility'];
  amends_id: string | null;
  occurred_at: Date | null;
  written_by: string | null;
  draft: string | null;
  leaf_index: string | null;
  name: string | null;
  role: Role | null;
  number: number | null;
  product: string | null;
  started_at: Date | null;
  clamps_off_at: Date | null;
  worked_at: Date | null;
  strings_at: Date | null;
}

const SEALED = 'This entry is sealed already. To correct it, add a correction beside it.';

function refuseWhileGoingUp({ expected }: EntryDraft, photos: DraftPhoto[]): void {
  const up = new Set(photos.map(({ photoId }) => photoId));
  const missing = expected.filter(({ photoId }) => !up.has(photoId)).length;
  if (missing === 0) return;
  throw new Conflict(
    missing === 1
      ? '1 photo is still going up. Wait for it, or take it off the entry.'
      : `${missing} photos are still going up. Wait for them, or take them off the entry.`,
  );
}

/**
 * Reads a draft of a case under lock.
 * @throws NotFound when the case has no such entry, Conflict when it is sealed or a photo of it is
 *   not up or not ready
 */
export async function draftToSeal(
  tx: Transaction,
  caseId: string,
  entryId: string,
): Promise<DraftToSeal> {
  const [row] = await select<Row>(
    `SELECT e.id, e.kind, e.phase, e.visibility, e.amends_id, e.occurred_at, e.written_by, e.draft,
            e.leaf_index, p.name, p.role, p.number,
            r.product, r.started_at, r.clamps_off_at, r.worked_at, r.strings_at
     FROM entries e
     LEFT JOIN people p ON p.id = e.written_by
     LEFT JOIN rests r ON r.entry_id = e.id
     WHERE e.case_id = ? AND e.id = ? FOR UPDATE`,
    [caseId, entryId],
    tx,
  );
  if (!row) throw new NotFound();
  if (row.draft === null) throw new Conflict(SEALED);
  const { name, role, number, product, started_at: startedAt } = row;
  const draft = EntryDraftSchema.parse(JSON.parse(row.draft));
  const photos = await draftPhotos(tx, entryId, row.visibility);
  refuseWhileGoingUp(draft, photos);
  return {
    id: row.id,
    kind: row.kind,
    phase: row.phase,
    visibility: row.visibility,
    amendsId: row.amends_id,
    occurredAt: row.occurred_at,
    writtenBy: row.written_by,
    draft,
    author: name !== null && role && number !== null ? { name, role, number } : null,
    rest:
      product !== null && startedAt
        ? {
            product,
            startedAt,
            clampsOffAt: row.clamps_off_at,
            workedAt: row.worked_at,
            stringsAt: row.strings_at,
          }
        : null,
    photos,
  };
}
