import { formatCaseNumber } from '#domain/case-number.ts';
import { select, type Transaction } from '#server/db/sql.ts';
import { queueMail } from '#server/mail/queue-mail.ts';
import type { Mail } from '#server/mail/templates.ts';

/** What every mail about a case says: whom it is for, and which instrument. */
export interface AboutCase {
  name: string;
  caseNumber: string;
  /** "Parlour guitar, Aldous Pike" */
  instrument: string;
}

interface Row {
  email: string | null;
  name: string;
  year: number;
  ordinal: number;
  kind: string;
  maker: string;
}

/**
 * Queues a mail to the instrument's owner, in the transaction of its cause.
 * @param onceKey a second mail with the same key is not queued
 * @param mail makes template and data from what every mail says
 * @returns whether there is an address to write to
 */
export async function mailOwner(
  tx: Transaction,
  caseId: string,
  onceKey: string,
  mail: (about: AboutCase) => Mail,
): Promise<boolean> {
  const [row] = await select<Row>(
    `SELECT c.email, c.name, k.year, k.ordinal, i.kind, i.maker
     FROM cases k
     JOIN parties p ON p.case_id = k.id AND p.part = 'owner'
     JOIN customers c ON c.id = p.customer_id
     JOIN instruments i ON i.id = k.instrument_id
     WHERE k.id = ? AND c.erased_at IS NULL`,
    [caseId],
    tx,
  );
  if (!row?.email) return false;
  const about = {
    name: row.name,
    caseNumber: formatCaseNumber(row),
    instrument: `${row.kind}, ${row.maker}`,
  };
  await queueMail(tx, { ...mail(about), to: row.email, caseId, onceKey });
  return true;
}
