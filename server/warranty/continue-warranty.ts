import { z } from 'zod';
import { withNamedLock } from '#server/db/named-lock.ts';
import { handOut } from './hand-out.ts';
import { makePaper } from './make-paper.ts';
import { sealPaper } from './seal-paper.ts';
import { sealWarranty } from './seal-warranty.ts';
import { sealedWarranty } from './sealed-warranty.ts';
import { signWarranty } from './sign-warranty.ts';
import { unsafeWarranty, type Step } from './warranty.ts';

const LOCK_SECONDS = 120;

/**
 * Takes a warranty one step further: signed, sealed, on paper, handed out. Each step ends with its
 * row, so that whatever was cut off is done again and nothing is done twice.
 * @returns the step it has got to
 */
export async function advanceWarranty(
  id: string,
  { now = new Date() }: { now?: Date } = {},
): Promise<Step> {
  const warranty = await unsafeWarranty(id);
  switch (warranty.step) {
    case 'drawn':
      await signWarranty(warranty);
      break;
    case 'credential':
      await sealWarranty(warranty, now);
      break;
    case 'sealed':
      await makePaper(await sealedWarranty(warranty), now);
      break;
    case 'paper':
      await sealPaper(await sealedWarranty(warranty), now);
      await handOut(warranty, now);
      break;
    case 'issued':
  }
  return (await unsafeWarranty(id)).step;
}

/** Issues a warranty from wherever it stopped to the end. One process at a time. */
export async function continueWarranty(id: string, { now }: { now?: Date } = {}): Promise<void> {
  const done = await withNamedLock(`warranty/${id}`, LOCK_SECONDS, async () => {
    const at = now ? { now } : {};
    for (let before: Step | null = null; before !== 'issued';) {
      const step = await advanceWarranty(id, at);
      if (step === before) throw new Error(`This warranty does not get beyond ${step}.`);
      before = step;
    }
    return true;
  });
  if (!done) throw new Error('Another process has been issuing this warranty for two minutes.');
}

const PayloadSchema = z.object({ warrantyId: z.uuid() });

/** The job 'issue-warranty'. */
export async function issueWarrantyJob(payload: unknown): Promise<void> {
  await continueWarranty(PayloadSchema.parse(payload).warrantyId);
}
