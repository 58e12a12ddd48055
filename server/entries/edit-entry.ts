import { EntrySchema } from '#domain/entry-draft.ts';
import { parseInput } from '#domain/input.ts';
import type { Viewer } from '#domain/viewer.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, transaction } from '#server/db/sql.ts';
import { lockCase } from '#server/record/lock-case.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { demandEntry } from './entry-rights.ts';
import { keepLinks } from './keep-links.ts';
import { keepRest } from './keep-rest.ts';
import { lockDraft } from './lock-draft.ts';
import { occurredAt } from './occurred-at.ts';

/** A changed draft as its form sends it. */
export interface EditedEntry extends Record<string, unknown> {
  caseNumber: string;
  entryId: string;
}

/**
 * Changes a draft. Corrections are drafts too until they are sealed, on a closed case as well.
 * Throws Invalid with a sentence per field, NotFound, Conflict once the entry is sealed, NotAllowed.
 */
export async function editEntry(
  viewer: Viewer,
  { caseNumber, entryId, ...form }: EditedEntry,
  { now = new Date() } = {},
): Promise<void> {
  const input = parseInput(EntrySchema, form);
  const writer = demandEntry(viewer, input);
  const { phase, visibility, draft } = input;
  const shop = await readShop();
  const happened = occurredAt(draft.occurredClock, shop.timeZone, now);
  await transaction(async (tx) => {
    const { id: caseId } = await lockCase(tx, caseNumber);
    const { writtenAt } = await lockDraft(tx, writer, { caseId, entryId });
    const expected = await keepLinks(tx, { ...input, caseId, entryId });
    await run(
      `UPDATE entries SET phase = ?, visibility = ?, draft = ?, occurred_at = ?, edited_at = ?
       WHERE id = ?`,
      [phase, visibility, JSON.stringify({ ...draft, expected }), happened, now, entryId],
      tx,
    );
    await keepRest(tx, { caseId, entryId, startedAt: happened ?? writtenAt, rest: draft.rest });
    await touchCase(tx, caseId);
  });
}
