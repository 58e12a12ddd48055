import { parseCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '../db/sql.ts';

interface Row {
  version: string | null;
}

// A customer's cases are those they are a party of; :customer is null for staff, who see all.
const SEEN = `(:customer IS NULL OR EXISTS (
  SELECT 1 FROM parties p WHERE p.case_id = c.id AND p.customer_id = :customer))`;

const ONE = `SELECT c.version FROM cases c
  WHERE c.year = :year AND c.ordinal = :ordinal AND ${SEEN}`;

// Versions only grow, and a case that comes or goes changes the count.
const ALL = `SELECT CONCAT(COUNT(*), '-', COALESCE(SUM(c.version), 0)) AS version FROM cases c
  WHERE (:customer IS NOT NULL OR c.handed_back_at IS NULL) AND ${SEEN}`;

/**
 * A word that changes whenever the case, or without a number any case the viewer's first page shows,
 * has changed: one query. Throws NotFound for a case that is not the viewer's to see.
 */
export async function readVersion(
  viewer: Viewer,
  { number }: { number: string | null },
): Promise<string> {
  demand(viewer, 'see cases', { own: true });
  const customer = viewer.kind === 'customer' ? viewer.customerId : null;
  const parsed = number === null ? null : parseCaseNumber(number);
  if (number !== null && parsed === null) throw new NotFound();
  const [row] =
    parsed === null
      ? await select<Row>(ALL, { customer })
      : await select<Row>(ONE, { ...parsed, customer });
  if (row === undefined) throw new NotFound();
  return String(row.version);
}
