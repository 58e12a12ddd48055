import { formatCaseNumber } from '#domain/case-number.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { select } from '#server/db/sql.ts';
import type { Step } from './warranty.ts';

/** A line of the list of warranties. */
export interface ListedWarranty {
  id: string;
  caseNumber: string;
  code: string;
  instrument: string;
  owner: string;
  step: Step;
  validUntil: Date;
  issuedAt: Date | null;
}

const PAGE = 50;

interface Row extends Omit<ListedWarranty, 'caseNumber'> {
  year: number;
  ordinal: number;
}

/**
 * The warranties of the shop, newest first, a page at a time.
 * @param before the id of the last one of the page before
 * @returns a page, and whether there are more
 */
export async function listWarranties(
  viewer: Viewer,
  { before = null }: { before?: string | null } = {},
): Promise<{ warranties: ListedWarranty[]; more: boolean }> {
  demand(viewer, 'see cases');
  const rows = await select<Row>(
    `SELECT w.id, c.year, c.ordinal, w.code, w.step, w.valid_until AS validUntil,
            w.issued_at AS issuedAt, CONCAT(i.kind, ', ', i.maker) AS instrument, o.name AS owner
     FROM warranties w
     JOIN cases c ON c.id = w.case_id
     JOIN instruments i ON i.id = c.instrument_id
     JOIN parties p ON p.case_id = c.id AND p.part = 'owner'
     JOIN customers o ON o.id = p.customer_id
     WHERE :before IS NULL OR w.id < :before
     ORDER BY w.id DESC LIMIT :most`,
    { before, most: PAGE + 1 },
  );
  const warranties = rows.slice(0, PAGE).map(({ year, ordinal, code, ...row }) => ({
    ...row,
    code: formatCode(code),
    caseNumber: formatCaseNumber({ year, ordinal }),
  }));
  return { warranties, more: rows.length > PAGE };
}
