import { formatCaseNumber } from '#domain/case-number.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';

/** An instrument of a known owner, with its history in the shop. */
export interface KnownInstrument {
  id: string;
  kind: string;
  maker: string;
  model: string | null;
  serial: string | null;
  /** Its cases, newest first. */
  cases: { number: string; job: string; takenInAt: Date }[];
}

interface Row extends Omit<KnownInstrument, 'cases'> {
  year: number | null;
  ordinal: number | null;
  job: string | null;
  takenInAt: Date | null;
}

/** The instruments on record with one owner and the cases of each, newest case first. One query. */
export async function listInstrumentsOf(
  viewer: Viewer,
  { ownerId }: { ownerId: string },
): Promise<KnownInstrument[]> {
  demand(viewer, 'take in');
  const rows = await select<Row>(
    `SELECT i.id, i.kind, i.maker, i.model, i.serial,
            c.year, c.ordinal, c.job, c.taken_in_at AS takenInAt
     FROM instruments i LEFT JOIN cases c ON c.instrument_id = i.id
     WHERE i.owner_id = ? ORDER BY c.taken_in_at DESC, i.id`,
    [ownerId],
  );
  const found = new Map<string, KnownInstrument>();
  for (const { year, ordinal, job, takenInAt, ...instrument } of rows) {
    const known = found.get(instrument.id) ?? { ...instrument, cases: [] };
    found.set(instrument.id, known);
    if (year && ordinal && job !== null && takenInAt)
      known.cases.push({ number: formatCaseNumber({ year, ordinal }), job, takenInAt });
  }
  return [...found.values()];
}
