import { v7 } from 'uuid';
import { z } from 'zod';
import { Conflict, Invalid } from '#domain/errors.ts';
import { neededText, parseInput } from '#domain/input.ts';
import { readAmount } from '#domain/money.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { Estimate } from '#server/db/models/estimate.ts';
import { select, transaction } from '#server/db/sql.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';
import { readShop } from '#server/shop/read-shop.ts';

/** An estimate as its form sends it. */
export const EstimateSchema = z.object({
  summary: neededText(
    'What is to be done',
    2000,
    'What is to be done for it? Write it in a line or two.',
  ),
  /** With tax, as typed. */
  total: neededText('The total', 24, 'The total is missing. Write it with tax.'),
});

/**
 * Writes down a revision of a case's estimate as sent: it replaces the one before, and the case waits
 * for the owner's answer. Throws Invalid with a sentence per field, Conflict when the case is closed.
 */
export async function sendEstimate(
  viewer: Viewer,
  { caseNumber, ...form }: { caseNumber: string } & Record<string, unknown>,
  { now = new Date() } = {},
): Promise<{ revision: number }> {
  demand(viewer, 'write estimate');
  const { personId: writtenBy } = staffOnly(viewer);
  const { summary, total } = parseInput(EstimateSchema, form);
  const { currency } = await readShop();
  const read = readAmount(total, currency);
  if ('sentence' in read) throw new Invalid({ total: read.sentence });
  return transaction(async (tx) => {
    const { id: caseId, closedAt } = await lockCase(tx, caseNumber);
    if (closedAt) throw new Conflict('The case is closed. No estimate is sent for it any more.');
    const [last] = await select<{ revision: number }>(
      'SELECT revision FROM estimates WHERE case_id = ? ORDER BY revision DESC LIMIT 1',
      [caseId],
      tx,
    );
    const revision = (last?.revision ?? 0) + 1;
    const totalMinor = read.minor.toString();
    await Estimate.create(
      { id: v7(), caseId, revision, summary, totalMinor, currency, writtenBy, sentAt: now },
      { transaction: tx },
    );
    await touchCase(tx, caseId);
    await recordAct(tx, viewer, { act: 'sent an estimate', caseId }, { now });
    return { revision };
  });
}
