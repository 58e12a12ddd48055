import { v7 } from 'uuid';
import { EntryDraftSchema, type EntryDraft } from '#domain/entry-draft.ts';
import { Conflict, NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import type { EntryBody } from '#evidence/chain/entry-shown.ts';
import { isStoryKind } from '#evidence/seal/kinds.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { lockCase, staffOnly } from './lock-case.ts';
import { readSealedBench, readSealedShown, type SealedBench } from './read-sealed.ts';

interface Original {
  id: string;
  kind: string;
  phase: string;
  visibility: string;
  occurred_at: Date | null;
  written_by: string | null;
  amends_id: string | null;
  leaf_index: string | null;
}

async function originalOf(tx: Transaction, caseId: string, entryId: string): Promise<Original> {
  const find = (id: string) =>
    select<Original>(
      `SELECT id, kind, phase, visibility, occurred_at, written_by, amends_id, leaf_index
       FROM entries WHERE case_id = ? AND id = ? FOR UPDATE`,
      [caseId, id],
      tx,
    );
  const [entry] = await find(entryId);
  // A correction of a correction names the entry that the first one corrects.
  const [original] = entry?.amends_id ? await find(entry.amends_id) : [entry];
  if (!original) throw new NotFound();
  if (original.leaf_index === null) {
    throw new Conflict('This entry is not sealed yet. Edit it as it is.');
  }
  if (!isStoryKind(original.kind)) {
    throw new Conflict('This entry records an event and has no words to correct.');
  }
  return original;
}

function draftFrom(body: EntryBody, bench: SealedBench | undefined): EntryDraft {
  return EntryDraftSchema.parse({
    title: body.title,
    text: body.text,
    benchNote: bench?.note ?? '',
    used: body.used,
    temperature: body.climate?.temperature.q ?? null,
    humidity: body.climate?.humidity.q ?? null,
    minutes: bench?.minutes ?? null,
    occurredClock: body.occurred,
    rest: null,
  });
}

async function latestWords(tx: Transaction, original: Original): Promise<EntryDraft> {
  const [latest] = await select<{ leaf_index: string }>(
    `SELECT MAX(leaf_index) AS leaf_index FROM entries WHERE id = :id OR amends_id = :id`,
    { id: original.id },
    tx,
  );
  const leaf = Number(latest?.leaf_index);
  const bench = (await readSealedBench([leaf], tx)).get(leaf);
  const body = (await readSealedShown([leaf], tx)).get(leaf)?.body ?? bench?.body;
  if (!body) throw new Conflict('The words of this entry are no longer kept. Add a new entry.');
  return draftFrom(body, bench);
}

/**
 * Begins a correction of a sealed entry: a draft beside it with the words as they stand now, to be
 * edited and sealed like any other. The sealed entry stays as it is.
 * @returns the id of the draft, the one already begun when there is one
 * @throws NotFound, NotAllowed by role, Conflict when the entry is not sealed or has no words
 */
export async function amendEntry(
  viewer: Viewer,
  { caseNumber, entryId }: { caseNumber: string; entryId: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<{ entryId: string }> {
  const staff = staffOnly(viewer);
  return transaction(async (tx) => {
    const repair = await lockCase(tx, caseNumber);
    const original = await originalOf(tx, repair.id, entryId);
    demand(viewer, 'amend', { own: original.written_by === staff.personId });
    const [begun] = await select<{ id: string }>(
      'SELECT id FROM entries WHERE amends_id = ? AND leaf_index IS NULL',
      [original.id],
      tx,
    );
    if (begun) return { entryId: begun.id };
    const id = v7();
    await run(
      `INSERT INTO entries (id, case_id, kind, phase, visibility, amends_id, draft, occurred_at,
                            written_by, written_at, edited_at)
       VALUES (:id, :caseId, 'amendment', :phase, :visibility, :amends, :draft, :occurred, :by, :now, :now)`,
      {
        id,
        caseId: repair.id,
        phase: original.phase,
        visibility: original.visibility,
        amends: original.id,
        draft: JSON.stringify(await latestWords(tx, original)),
        occurred: original.occurred_at,
        by: staff.personId,
        now,
      },
      tx,
    );
    await touchCase(tx, repair.id);
    return { entryId: id };
  });
}
