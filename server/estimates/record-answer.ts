import { z } from 'zod';
import { Conflict } from '#domain/errors.ts';
import { parseInput } from '#domain/input.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';
import { sealAuthorisation } from '#server/record/seal-authorisation.ts';

/** The owner's answer as the front desk records it. */
export const AnswerSchema = z.object({
  answer: z.enum(['authorised', 'declined'], {
    error: 'What did the owner say? Choose authorised or declined.',
  }),
  /** The revision the owner has in front of them. */
  revision: z.coerce.number().int().min(1),
});

interface OpenEstimate {
  id: string;
  revision: number;
  totalMinor: string;
  currency: string;
}

async function openEstimate(
  tx: Transaction,
  caseId: string,
  revision: number,
): Promise<OpenEstimate> {
  const [newest] = await select<OpenEstimate & { answer: string | null }>(
    `SELECT id, revision, total_minor AS totalMinor, currency, answer
     FROM estimates WHERE case_id = ? ORDER BY revision DESC LIMIT 1 FOR UPDATE`,
    [caseId],
    tx,
  );
  if (!newest || newest.answer !== null)
    throw new Conflict('No estimate waits for an answer on this case.');
  if (newest.revision !== revision)
    throw new Conflict(
      `Revision ${newest.revision} has replaced this one. Show the owner that, then record the answer.`,
    );
  return newest;
}

/**
 * Records in the owner's presence what they answered to the newest revision. An authorisation is
 * sealed at once; a declined estimate lets the case go on without the work.
 * Throws NotFound, Conflict when nothing waits for an answer or another revision has replaced it.
 */
export async function recordAnswer(
  viewer: Viewer,
  { caseNumber, ...form }: { caseNumber: string } & Record<string, unknown>,
  { now = new Date() } = {},
): Promise<void> {
  demand(viewer, 'record authorisation');
  const staff = staffOnly(viewer);
  const { answer, revision } = parseInput(AnswerSchema, form);
  await transaction(async (tx) => {
    const { id: caseId, record } = await lockCase(tx, caseNumber);
    const estimate = await openEstimate(tx, caseId, revision);
    await run(
      'UPDATE estimates SET answer = ?, answered_at = ?, recorded_by = ? WHERE id = ?',
      [answer, now, staff.personId, estimate.id],
      tx,
    );
    if (answer === 'authorised')
      await sealAuthorisation(tx, staff, {
        caseId,
        record,
        text: `Estimate, revision ${revision}: authorised by the owner in person.`,
        money: { minor: Number(estimate.totalMinor), cur: estimate.currency },
        now,
      });
    await touchCase(tx, caseId);
    await recordAct(
      tx,
      viewer,
      { act: `recorded: ${answer}`, caseId, subjectId: estimate.id },
      { now },
    );
  });
}
