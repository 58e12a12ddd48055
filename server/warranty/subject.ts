import { dayIn } from '#domain/calendar.ts';
import { select } from '#server/db/sql.ts';
import { readShop } from '#server/shop/read-shop.ts';
import type { Warranty } from './warranty.ts';
import { dayInWords, shortSerial, termInWords } from './words.ts';

/** What a warranty says of its subject, in words that name nobody. */
export interface Subject {
  /** "Parlour guitar, Aldous Pike, serial …17" */
  instrument: string;
  work: string;
  /** "2 years, to 24 April 2028" */
  term: string;
}

/** The subject of a warranty as its credential and Verify state it. */
export async function subjectOf({ caseId, work, months, validUntil }: Warranty): Promise<Subject> {
  const [row] = await select<{ kind: string; maker: string; serial: string | null }>(
    `SELECT i.kind, i.maker, i.serial FROM cases c JOIN instruments i ON i.id = c.instrument_id
     WHERE c.id = ?`,
    [caseId],
  );
  if (!row) throw new Error('A warranty’s case has an instrument.');
  const { timeZone } = await readShop();
  const serial = shortSerial(row.serial);
  return {
    instrument: [row.kind, row.maker, ...(serial ? [`serial ${serial}`] : [])].join(', '),
    work: work.map(({ text }) => text).join('; '),
    term: `${termInWords(months)}, to ${dayInWords(dayIn(validUntil, timeZone))}`,
  };
}
