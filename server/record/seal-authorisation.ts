import type { Transaction } from '#server/db/sql.ts';
import { sealEvent } from './seal-event.ts';
import { staffPart, type Person } from './person-in-record.ts';

/** What the owner authorised, recorded by one of the shop's people. */
export interface Authorisation {
  caseId: string;
  /** The case's record id, 16 bytes. */
  record: Buffer;
  /** What was authorised, without names or prices: "Estimate, revision 2, authorised in person." */
  text: string;
  /** The amount in the currency's smallest unit with its ISO 4217 code: a part of its own. */
  money: { minor: number; cur: string } | null;
  now: Date;
}

/**
 * Seals an authorisation of the owner. The caller has demanded the right and locked the case's row.
 * @returns the index of its leaf and the time it was sealed at
 */
export async function sealAuthorisation(
  tx: Transaction,
  by: Person,
  { caseId, record, text, money, now }: Authorisation,
): Promise<{ leafIndex: number; recordedAt: Date }> {
  const { leafIndex, recordedAt } = await sealEvent(tx, {
    caseId,
    record,
    kind: 'authorisation',
    phase: 'before',
    shown: { v: 1, text },
    parts: { ...staffPart(by), ...(money ? { money: { v: 1, ...money } } : {}) },
    names: [],
    by,
    now,
  });
  return { leafIndex, recordedAt };
}
