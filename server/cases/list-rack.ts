import { formatCaseNumber, formatOrdinal } from '#domain/case-number.ts';
import type { CaseStateNow } from '#domain/case-state.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { unsafeFirstPhotos, type CaseThumb } from './first-photos.ts';
import { unsafeReadFacts, type CaseEstimate, type StateColumns } from './read-facts.ts';

/** An open case as its tag on the Rack shows it. */
export interface RackCase {
  /** "2026-031" */
  number: string;
  year: number;
  /** "031" */
  ordinal: string;
  kind: string;
  maker: string;
  owner: string;
  technicianId: string | null;
  technician: string | null;
  promisedOn: string | null;
  nextStep: string | null;
  onHold: string | null;
  state: CaseStateNow;
  estimate: CaseEstimate | null;
  closedAt: Date | null;
  closedBy: string | null;
  ownerToldAt: Date | null;
  thumb: CaseThumb | null;
}

interface Row extends StateColumns {
  year: number;
  ordinal: number;
  kind: string;
  maker: string;
  owner: string;
  technicianId: string | null;
  technician: string | null;
  promisedOn: string | null;
  nextStep: string | null;
  ownerToldAt: Date | null;
}

const OPEN_CASES = `
  SELECT c.id, c.year, c.ordinal, c.technician_id AS technicianId, c.on_hold AS onHold,
         c.promised_on AS promisedOn, c.next_step AS nextStep, c.closed_at AS closedAt,
         c.handed_back_at AS handedBackAt, c.owner_told_at AS ownerToldAt,
         i.kind, i.maker, o.name AS owner, t.name AS technician
  FROM cases c
  JOIN instruments i ON i.id = c.instrument_id
  JOIN parties p ON p.case_id = c.id AND p.part = 'owner'
  JOIN customers o ON o.id = p.customer_id
  LEFT JOIN people t ON t.id = c.technician_id
  WHERE c.handed_back_at IS NULL
  ORDER BY c.year, c.ordinal`;

/**
 * The open cases with what each waits for, in the order of their numbers; of one person's work when
 * `technicianId` is given. Five queries, however many cases.
 */
export async function listRack(
  viewer: Viewer,
  { technicianId = null }: { technicianId?: string | null } = {},
  { now = new Date() } = {},
): Promise<RackCase[]> {
  demand(viewer, 'see cases');
  const all = await select<Row>(OPEN_CASES);
  const rows = technicianId ? all.filter((row) => row.technicianId === technicianId) : all;
  const [facts, thumbs] = await Promise.all([
    unsafeReadFacts(rows, { now }),
    unsafeFirstPhotos(
      rows.map(({ id }) => id),
      { ownersOnly: false },
    ),
  ]);
  return rows.flatMap(({ id, ordinal, handedBackAt: _open, ...row }) => {
    const known = facts.get(id);
    if (!known) return [];
    const { state, estimate, closedBy } = known;
    return {
      ...row,
      number: formatCaseNumber({ year: row.year, ordinal }),
      ordinal: formatOrdinal(ordinal),
      state,
      estimate,
      closedBy,
      thumb: thumbs.get(id) ?? null,
    };
  });
}
