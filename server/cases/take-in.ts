import { v7 } from 'uuid';
import { addDays, dayIn } from '#domain/calendar.ts';
import { formatCaseNumber } from '#domain/case-number.ts';
import { Invalid } from '#domain/errors.ts';
import { parseInput } from '#domain/input.ts';
import { TakeInSchema, type TakeIn } from '#domain/intake.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { keepCustomer } from '#server/customers/keep-customer.ts';
import { Case } from '#server/db/models/case.ts';
import { Party } from '#server/db/models/party.ts';
import { select, transaction, type Transaction } from '#server/db/sql.ts';
import { startTimeline } from '#server/entries/start-timeline.ts';
import { keepInstrument, type KeptInstrument } from '#server/instruments/keep-instrument.ts';
import { staffOnly } from '#server/record/lock-case.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { drawRecord, drawTagCode } from './draw-record.ts';
import { nextOrdinal, openYear } from './next-ordinal.ts';
import { queueReceipt } from './queue-receipt.ts';

/** What taking in gives back. */
export interface TakenIn {
  /** "2026-031" */
  number: string;
  /** The draft that began the timeline. */
  entryId: string;
  onHold: string | null;
}

function refusePastDay(promisedOn: string | null, today: string): void {
  if (promisedOn === null) return;
  if (promisedOn < today)
    throw new Invalid({ promisedOn: 'This day is past. Give a day from today on.' });
  if (promisedOn > addDays(today, 1827))
    throw new Invalid({ promisedOn: 'This is more than five years away. Check the year.' });
}

async function refuseUnknownPerson(tx: Transaction, id: string | null): Promise<void> {
  if (id === null) return;
  const [person] = await select(
    'SELECT id FROM people WHERE id = ? AND removed_at IS NULL',
    [id],
    tx,
  );
  if (!person)
    throw new Invalid({ technicianId: 'This person is not in the shop any more. Choose another.' });
}

async function keepParties(
  tx: Transaction,
  { input, caseId, ownerId, now }: { input: TakeIn; caseId: string; ownerId: string; now: Date },
): Promise<void> {
  const other = async (part: 'bringer' | 'payer') => {
    const choice = input[part];
    return choice ? (await keepCustomer(tx, choice, { field: part, now })).id : ownerId;
  };
  const bringerId = await other('bringer');
  const payerId = await other('payer');
  await Party.bulkCreate(
    [
      { caseId, part: 'owner', customerId: ownerId },
      { caseId, part: 'bringer', customerId: bringerId },
      { caseId, part: 'payer', customerId: payerId },
    ],
    { transaction: tx },
  );
}

interface NewCase {
  input: TakeIn;
  instrument: KeptInstrument;
  year: number;
  ordinal: number;
  takenInBy: string;
  now: Date;
}

async function keepCase(
  tx: Transaction,
  { input, instrument, year, ordinal, takenInBy, now }: NewCase,
): Promise<string> {
  const id = v7();
  await Case.create(
    {
      id,
      year,
      ordinal,
      record: drawRecord(),
      tagCode: drawTagCode(),
      instrumentId: instrument.id,
      technicianId: input.technicianId,
      takenInBy,
      takenInAt: now,
      complaint: input.complaint,
      job: input.job,
      accessories: input.accessories,
      consentPhotos: input.consentPhotos,
      consentPublish: input.publishWork ? 'work' : 'number',
      promisedOn: input.promisedOn,
      nextStep: input.nextStep,
      place: input.place,
      onHold: instrument.onHold,
    },
    { transaction: tx },
  );
  return id;
}

/**
 * Takes an instrument in: customer and instrument found or new, a numbered case with its parties, the
 * first draft on its timeline and the receipt in the outbox, all in one transaction.
 * Throws Invalid with a sentence per field. `series` is the year whose numbers are drawn, the shop's
 * present one unless given: cases carried over from paper keep theirs.
 */
export async function takeIn(
  viewer: Viewer,
  input: unknown,
  { now = new Date(), series }: { now?: Date; series?: number } = {},
): Promise<TakenIn> {
  demand(viewer, 'take in');
  const staff = staffOnly(viewer);
  const wanted = parseInput(TakeInSchema, input);
  const shop = await readShop();
  const today = dayIn(now, shop.timeZone);
  refusePastDay(wanted.promisedOn, today);
  const year = series ?? Number(today.slice(0, 4));
  await openYear(year);
  return transaction(async (tx) => {
    // The number first: its lock makes takings in come one after another, so that one address typed
    // twice at once is still one customer.
    const ordinal = await nextOrdinal(tx, year);
    await refuseUnknownPerson(tx, wanted.technicianId);
    const owner = await keepCustomer(tx, wanted.owner, { field: 'owner', now });
    const instrument = await keepInstrument(tx, wanted.instrument, {
      ownerId: owner.id,
      currency: shop.currency,
      now,
    });
    const id = await keepCase(tx, {
      input: wanted,
      instrument,
      year,
      ordinal,
      takenInBy: staff.personId,
      now,
    });
    await keepParties(tx, { input: wanted, caseId: id, ownerId: owner.id, now });
    const entryId = await startTimeline(tx, { viewer: staff, caseId: id, takeIn: wanted, now });
    const number = formatCaseNumber({ year, ordinal });
    await queueReceipt(tx, { caseId: id, number, owner, instrument, takeIn: wanted, now });
    await recordAct(tx, viewer, { act: 'took in', caseId: id }, { now });
    return { number, entryId, onHold: instrument.onHold };
  });
}
