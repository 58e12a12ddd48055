import { dayInWords } from '#domain/calendar.ts';
import type { TakeIn } from '#domain/intake.ts';
import type { KeptCustomer } from '#server/customers/keep-customer.ts';
import type { Transaction } from '#server/db/sql.ts';
import type { KeptInstrument } from '#server/instruments/keep-instrument.ts';
import { queueMail } from '#server/mail/queue-mail.ts';

/** What the receipt speaks of. */
export interface Receipt {
  caseId: string;
  number: string;
  owner: KeptCustomer;
  instrument: KeptInstrument;
  takeIn: TakeIn;
  now: Date;
}

/** Queues the receipt to the owner with the taking in; nothing for an owner without an e-mail address. */
export async function queueReceipt(
  tx: Transaction,
  { caseId, number, owner, instrument, takeIn, now }: Receipt,
): Promise<void> {
  if (owner.email === null) return;
  await queueMail(
    tx,
    {
      template: 'receipt',
      to: owner.email,
      caseId,
      onceKey: `receipt ${caseId}`,
      data: {
        name: owner.name,
        caseNumber: number,
        instrument: `${instrument.kind}, ${instrument.maker}`,
        accessories: takeIn.accessories,
        promisedOn: takeIn.promisedOn && dayInWords(takeIn.promisedOn),
      },
    },
    { now },
  );
}
