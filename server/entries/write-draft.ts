import type { EntryInput } from '#domain/entry-draft.ts';
import type { StaffViewer } from '#domain/viewer.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { Entry } from '#server/db/models/entry.ts';
import type { Transaction } from '#server/db/sql.ts';
import { keepLinks } from './keep-links.ts';
import { keepRest } from './keep-rest.ts';

/** A draft to be written into a case whose row is locked. */
export interface DraftToWrite extends EntryInput {
  id: string;
  caseId: string;
  writer: StaffViewer;
  occurredAt: Date | null;
  now: Date;
}

/** Writes a new draft with its photos and its rest, in the transaction of the caller. */
export async function writeDraft(
  tx: Transaction,
  { id, caseId, writer, occurredAt, now, ...input }: DraftToWrite,
): Promise<void> {
  const { phase, visibility, draft } = input;
  const entry = await Entry.create(
    {
      id,
      caseId,
      kind: 'entry',
      phase,
      visibility,
      draft: JSON.stringify(draft),
      occurredAt,
      writtenBy: writer.personId,
      writtenAt: now,
      editedAt: now,
    },
    { transaction: tx },
  );
  const expected = await keepLinks(tx, { ...input, caseId, entryId: id });
  if (expected.length > 0)
    await entry.update({ draft: JSON.stringify({ ...draft, expected }) }, { transaction: tx });
  await keepRest(tx, { caseId, entryId: id, startedAt: occurredAt ?? now, rest: draft.rest });
  await touchCase(tx, caseId);
}
