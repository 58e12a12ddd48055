import { v7 } from 'uuid';
import { env } from '../env.ts';
import type { Transaction } from '../db/sql.ts';
import { queueJob } from '../jobs/queue-job.ts';
import { MailAddressSchema } from './address.ts';
import type { Mail } from './templates.ts';

/** A mail to be sent. `onceKey`: a second one with the same key is not queued. */
export type NewMail = Mail & {
  /** Null: nobody; the same work is done and nothing is sent. */
  to: string | null;
  caseId?: string | null;
  onceKey?: string | null;
  /** Later than this the mail is of no use and is dropped. */
  notAfter?: Date;
};

/**
 * Queues a mail in the transaction of its cause. Its Message-ID is made here and kept, so that a
 * mail sent twice is one mail to the reader's program. Throws a ZodError for an address that is none.
 */
export async function queueMail(
  tx: Transaction,
  { to, caseId = null, onceKey = null, notAfter, ...mail }: NewMail,
  { now = new Date() } = {},
): Promise<void> {
  const payload = {
    ...mail,
    to: to === null ? null : MailAddressSchema.parse(to),
    messageId: `<${v7()}@${new URL(env().PUBLIC_URL).hostname}>`,
    notAfter: notAfter?.toISOString() ?? null,
  };
  await queueJob(tx, { kind: 'mail', payload, caseId, onceKey }, { now });
}
