import { select, type Transaction } from '#server/db/sql.ts';

/** Where the issuing of a warranty has got to. Only an issued one was handed to anybody. */
export type Step = 'drawn' | 'credential' | 'sealed' | 'paper' | 'issued';

/** A line of covered work and who did it. */
export interface WorkLine {
  text: string;
  /** Id of one of the shop's people; their name stands on the paper alone. */
  personId: string;
}

/** A warranty as the database has it. */
export interface Warranty {
  id: string;
  caseId: string;
  /** The case's record id, 16 bytes. */
  record: Buffer;
  /** Eleven signs, without hyphens. */
  code: string;
  step: Step;
  work: WorkLine[];
  months: number;
  validFrom: Date;
  /** The last instant in force. */
  validUntil: Date;
  jws: string | null;
  /** The seal value, 32 bytes; null before it is sealed. */
  seal: Buffer | null;
  leafIndex: number | null;
  issuedBy: string;
  drawnAt: Date;
  issuedAt: Date | null;
}

interface Row extends Omit<Warranty, 'work' | 'leafIndex'> {
  work: string;
  leafIndex: string | null;
}

const COLUMNS = `w.id, w.case_id AS caseId, c.record, w.code, w.step, w.work, w.months,
  w.valid_from AS validFrom, w.valid_until AS validUntil, w.jws, w.seal,
  w.leaf_index AS leafIndex, w.issued_by AS issuedBy, w.drawn_at AS drawnAt,
  w.issued_at AS issuedAt`;

/**
 * Warranties for which `condition` on `warranties w` and its case `c` holds, newest first. The
 * condition carries the viewer's scope, which is why the name begins with a warning.
 */
export async function unsafeWarranties(
  condition: string,
  params: Record<string, string | number | Date>,
  tx?: Transaction,
): Promise<Warranty[]> {
  const rows = await select<Row>(
    `SELECT ${COLUMNS} FROM warranties w JOIN cases c ON c.id = w.case_id
     WHERE ${condition} ORDER BY w.id DESC`,
    params,
    tx,
  );
  return rows.map(({ work, leafIndex, ...row }) => ({
    ...row,
    work: JSON.parse(work) as WorkLine[],
    leafIndex: leafIndex === null ? null : Number(leafIndex),
  }));
}

/** One warranty by id, for the job that issues it. */
export async function unsafeWarranty(id: string, tx?: Transaction): Promise<Warranty> {
  const [warranty] = await unsafeWarranties('w.id = :id', { id }, tx);
  if (!warranty) throw new Error(`There is no warranty ${id}.`);
  return warranty;
}
