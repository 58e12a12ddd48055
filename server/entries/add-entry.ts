import { v7, validate } from 'uuid';
import { EntrySchema } from '#domain/entry-draft.ts';
import { Conflict } from '#domain/errors.ts';
import { parseInput } from '#domain/input.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select, transaction, type Transaction } from '#server/db/sql.ts';
import { lockCase } from '#server/record/lock-case.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { demandEntry } from './entry-rights.ts';
import { occurredAt } from './occurred-at.ts';
import { writeDraft } from './write-draft.ts';

/** An entry as its form sends it; `entryId` when the page made it beforehand. */
export interface NewEntry extends Record<string, unknown> {
  caseNumber: string;
  entryId?: string;
}

/** The sentence for anything that would change a closed case. */
export const CASE_CLOSED =
  'The case is closed. Nothing is added to it any more; corrections stand beside the entry they correct.';

async function isThere(tx: Transaction, caseId: string, entryId: string): Promise<boolean> {
  const [row] = await select<{ caseId: string }>(
    'SELECT case_id AS caseId FROM entries WHERE id = ?',
    [entryId],
    tx,
  );
  if (row && row.caseId !== caseId)
    throw new Conflict('This page is out of date. Open the case again and add the entry there.');
  return row !== undefined;
}

/**
 * Adds an entry to a case's timeline as a draft, with the photos that are up; those that are not are
 * expected. The same `entryId` again changes nothing: a form may be sent twice over a bad line.
 * Throws Invalid with a sentence per field, NotFound for an unknown case, Conflict when it is closed.
 */
export async function addEntry(
  viewer: Viewer,
  { caseNumber, entryId, ...form }: NewEntry,
  { now = new Date() } = {},
): Promise<{ entryId: string }> {
  const input = parseInput(EntrySchema, form);
  const writer = demandEntry(viewer, input);
  const id = entryId !== undefined && validate(entryId) ? entryId : v7();
  const shop = await readShop();
  const happened = occurredAt(input.draft.occurredClock, shop.timeZone, now);
  return transaction(async (tx) => {
    const { id: caseId, closedAt } = await lockCase(tx, caseNumber);
    if (await isThere(tx, caseId, id)) return { entryId: id };
    if (closedAt) throw new Conflict(CASE_CLOSED);
    await writeDraft(tx, { ...input, id, caseId, writer, occurredAt: happened, now });
    return { entryId: id };
  });
}
