import { formatCaseNumber } from '#domain/case-number.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '../db/sql.ts';

interface Row {
  year: number;
  ordinal: number;
}

// A customer's cases are those they are a party of; :customer is null for staff, who see all.
const FIND = `
  SELECT c.year, c.ordinal FROM cases c
  WHERE c.tag_code = :code AND (:customer IS NULL OR EXISTS (
    SELECT 1 FROM parties p WHERE p.case_id = c.id AND p.customer_id = :customer))`;

/**
 * The number of the case whose printed tag has this code, or null: for a code that is none, a case
 * that is not the viewer's, and the public, all alike.
 */
export async function findTagged(
  viewer: Viewer,
  { code }: { code: string },
): Promise<string | null> {
  if (viewer.kind === 'public') return null;
  const customer = viewer.kind === 'customer' ? viewer.customerId : null;
  const [row] = await select<Row>(FIND, { code, customer });
  return row === undefined ? null : formatCaseNumber(row);
}
