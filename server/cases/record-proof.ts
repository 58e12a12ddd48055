import { v7 } from 'uuid';
import { z } from 'zod';
import { EntrySchema } from '#domain/entry-draft.ts';
import { Conflict } from '#domain/errors.ts';
import { neededText, parseInput } from '#domain/input.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { writeDraft } from '#server/entries/write-draft.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';

/** How ownership was shown. */
export const ProofSchema = z.object({
  proof: neededText(
    'The proof',
    400,
    'What shows whose it is? Name the papers, or who confirmed it and when.',
  ),
});

/**
 * Lets a case that asked for proof go on: what was shown is written down for the bench only. Throws
 * Invalid without it, NotFound, Conflict when the case is not on hold.
 */
export async function recordProof(
  viewer: Viewer,
  { caseNumber, ...form }: { caseNumber: string } & Record<string, unknown>,
  { now = new Date() } = {},
): Promise<void> {
  demand(viewer, 'take in');
  const writer = staffOnly(viewer);
  const { proof } = parseInput(ProofSchema, form);
  await transaction(async (tx) => {
    const { id } = await lockCase(tx, caseNumber);
    const [row] = await select<{ onHold: string | null }>(
      'SELECT on_hold AS onHold FROM cases WHERE id = ?',
      [id],
      tx,
    );
    if (row?.onHold == null) throw new Conflict('Nothing holds this case up. Go on with it.');
    await run('UPDATE cases SET on_hold = NULL WHERE id = ?', [id], tx);
    await writeDraft(tx, {
      ...EntrySchema.parse({
        phase: 'before',
        visibility: 'bench',
        draft: { title: 'Proof of ownership recorded', text: proof },
      }),
      id: v7(),
      caseId: id,
      writer,
      occurredAt: null,
      now,
    });
    await recordAct(tx, viewer, { act: 'recorded proof of ownership', caseId: id }, { now });
  });
}
