import { parseCaseNumber } from '#domain/case-number.ts';
import { NotAllowed, NotFound } from '#domain/errors.ts';
import type { StaffViewer, Viewer } from '#domain/viewer.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** A case as the acts on its record need it. */
export interface LockedCase {
  id: string;
  /** The 16 random bytes that stand for the case in the witness log. */
  record: Buffer;
  closedAt: Date | null;
  handedBackAt: Date | null;
}

interface Row {
  id: string;
  record: Buffer;
  closed_at: Date | null;
  handed_back_at: Date | null;
}

const COLUMNS = 'id, record, closed_at, handed_back_at';

const lockedCase = ({ id, record, closed_at, handed_back_at }: Row): LockedCase => ({
  id,
  record,
  closedAt: closed_at,
  handedBackAt: handed_back_at,
});

/**
 * Locks a case's row until the transaction ends, so that acts on one case come one after another.
 * Taken before the head lock, always.
 * @throws NotFound for an unknown number
 */
export async function lockCase(tx: Transaction, caseNumber: string): Promise<LockedCase> {
  const number = parseCaseNumber(caseNumber);
  if (!number) throw new NotFound();
  const [row] = await select<Row>(
    `SELECT ${COLUMNS} FROM cases WHERE year = ? AND ordinal = ? FOR UPDATE`,
    [number.year, number.ordinal],
    tx,
  );
  if (!row) throw new NotFound();
  return lockedCase(row);
}

/** As `lockCase`, by id, for a job that goes on with what was allowed before. */
export async function lockCaseById(tx: Transaction, caseId: string): Promise<LockedCase> {
  const [row] = await select<Row>(
    `SELECT ${COLUMNS} FROM cases WHERE id = ? FOR UPDATE`,
    [caseId],
    tx,
  );
  if (!row) throw new NotFound();
  return lockedCase(row);
}

/** The viewer as one of the shop's people. @throws NotAllowed for anyone else */
export function staffOnly(viewer: Viewer): StaffViewer {
  if (viewer.kind !== 'staff') throw new NotAllowed();
  return viewer;
}
