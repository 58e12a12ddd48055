import { randomBytes } from 'node:crypto';
import { v7 } from 'uuid';
import { z } from 'zod';
import { startOfDay, warrantyTerm } from '#domain/calendar.ts';
import { Conflict, Invalid } from '#domain/errors.ts';
import { neededText, parseInput } from '#domain/input.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { drawCode } from '#evidence/code/draw-code.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { queueJob } from '#server/jobs/queue-job.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';
import { readShop } from '#server/shop/read-shop.ts';
import type { WorkLine } from './warranty.ts';

/** A warranty as its form sends it. */
export const IssueSchema = z.object({
  months: z.coerce
    .number({ error: 'The term cannot be read. Write whole months.' })
    .int('The term cannot be read. Write whole months.')
    .min(1, 'A warranty lasts a month at least. Write whole months.')
    .max(120, 'More than ten years is too long to promise. Write 120 months or fewer.'),
  work: z
    .array(
      z.object({
        text: neededText(
          'A line of work',
          160,
          'A line of covered work is empty. Say what was done.',
        ),
        personId: z.uuid('Who did it? Choose one of the shop’s people.'),
      }),
    )
    .min(1, 'Nothing is covered. Keep at least one line of work.')
    .max(20, 'Twenty lines are the most a warranty holds. Put some together.'),
});

async function refuseStrangers(tx: Transaction, work: WorkLine[]): Promise<void> {
  const ids = [...new Set(work.map(({ personId }) => personId))];
  const known = await select<{ id: string }>('SELECT id FROM people WHERE id IN (?)', [ids], tx);
  if (known.length !== ids.length) {
    throw new Invalid({ work: 'Who did it? Choose one of the shop’s people.' });
  }
}

async function refuseSecond(tx: Transaction, caseId: string): Promise<void> {
  const [other] = await select<{ step: string }>(
    'SELECT step FROM warranties WHERE case_id = ?',
    [caseId],
    tx,
  );
  if (!other) return;
  throw new Conflict(
    other.step === 'issued'
      ? 'A warranty was issued for this case already. See it on the list of warranties.'
      : 'A warranty for this case is being issued. Wait a moment.',
  );
}

/**
 * Begins to issue a warranty from a closed case. What it says is fixed now; a job then signs it, has
 * it sealed, makes the paper and hands it out, and goes on from where it stopped whatever happens.
 * @throws NotFound, NotAllowed; Conflict while the case is open or when it has a warranty; Invalid
 *   with a sentence per field
 */
export async function issueWarranty(
  viewer: Viewer,
  { caseNumber, ...form }: { caseNumber: string } & Record<string, unknown>,
  { now = new Date() }: { now?: Date } = {},
): Promise<{ warrantyId: string; code: string }> {
  demand(viewer, 'issue warranty');
  const staff = staffOnly(viewer);
  const { months, work } = parseInput(IssueSchema, form);
  const { timeZone } = await readShop();
  return transaction(async (tx) => {
    const repair = await lockCase(tx, caseNumber);
    if (!repair.closedAt) {
      throw new Conflict('A warranty is drawn from a closed case. Close the case first.');
    }
    await refuseSecond(tx, repair.id);
    await refuseStrangers(tx, work);
    const term = warrantyTerm(repair.handedBackAt ?? repair.closedAt, timeZone, months);
    const made = { warrantyId: v7(), code: drawCode((bytes) => randomBytes(bytes)) };
    await run(
      `INSERT INTO warranties (id, case_id, code, step, work, months, valid_from, valid_until, issued_by, drawn_at)
       VALUES (:id, :caseId, :code, 'drawn', :work, :months, :from, :until, :by, :now)`,
      {
        id: made.warrantyId,
        caseId: repair.id,
        code: made.code,
        work: JSON.stringify(work),
        months,
        from: startOfDay(term.startsOn, timeZone),
        // The last instant in force, where the term gives the first that is not.
        until: new Date(term.endsAt.getTime() - 1),
        by: staff.personId,
        now,
      },
      tx,
    );
    await queueJob(tx, {
      kind: 'issue-warranty',
      payload: { warrantyId: made.warrantyId },
      caseId: repair.id,
      onceKey: `issue-warranty/${made.warrantyId}`,
    });
    await recordAct(tx, staff, {
      act: 'issued a warranty',
      caseId: repair.id,
      subjectId: made.warrantyId,
    });
    return made;
  });
}
