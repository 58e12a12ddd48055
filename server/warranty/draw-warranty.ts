import { warrantyTerm, type WarrantyTerm } from '#domain/calendar.ts';
import { Conflict } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { getCase } from '#server/cases/get-case.ts';
import { select } from '#server/db/sql.ts';
import { readSealedShown } from '#server/record/read-sealed.ts';
import { readShop } from '#server/shop/read-shop.ts';

/** A line the issuer can take over, change or leave out. */
export interface ProposedLine {
  text: string;
  personId: string;
  name: string;
  /** Whether it is ticked at first. */
  proposed: boolean;
}

/** What a warranty would say, drawn from a closed case. */
export interface DrawnWarranty {
  caseNumber: string;
  instrument: string;
  maker: string;
  owner: string;
  months: number;
  term: WarrantyTerm;
  lines: ProposedLine[];
}

/** Months a warranty lasts unless the issuer says otherwise: common practice, no source. */
export const USUAL_MONTHS = 24;

interface Row {
  leaf_index: string;
  phase: 'before' | 'during' | 'after';
  written_by: string;
  name: string;
}

async function linesOf(caseId: string): Promise<ProposedLine[]> {
  const rows = await select<Row>(
    `SELECT e.leaf_index, e.phase, e.written_by, p.name
     FROM entries e JOIN people p ON p.id = e.written_by
     WHERE e.case_id = ? AND e.leaf_index IS NOT NULL AND e.visibility = 'shared'
       AND e.kind IN ('entry', 'inspection') ORDER BY e.leaf_index`,
    [caseId],
  );
  const sealed = await readSealedShown(rows.map((row) => Number(row.leaf_index)));
  return rows.flatMap(({ leaf_index, phase, written_by, name }) => {
    const title = sealed.get(Number(leaf_index))?.body?.title;
    return title ? [{ text: title, personId: written_by, name, proposed: phase === 'during' }] : [];
  });
}

/**
 * Draws a warranty from a closed case: the titles of its sealed entries as lines of covered work.
 * @throws NotFound, NotAllowed; Conflict while the case is open
 */
export async function drawWarranty(
  viewer: Viewer,
  { caseNumber, months = USUAL_MONTHS }: { caseNumber: string; months?: number },
): Promise<DrawnWarranty> {
  demand(viewer, 'issue warranty');
  const [file, shop] = await Promise.all([getCase(viewer, { number: caseNumber }), readShop()]);
  if (!file.closedAt) {
    throw new Conflict('A warranty is drawn from a closed case. Close the case first.');
  }
  return {
    caseNumber: file.number,
    instrument: file.kind,
    maker: file.maker,
    owner: file.owner,
    months,
    term: warrantyTerm(file.handedBackAt ?? file.closedAt, shop.timeZone, months),
    lines: await linesOf(file.id),
  };
}
