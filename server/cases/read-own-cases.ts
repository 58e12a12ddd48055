import { formatCaseNumber } from '#domain/case-number.ts';
import type { CaseStateNow } from '#domain/case-state.ts';
import { NotAllowed } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { caseScope } from './case-scope.ts';
import { unsafeFirstPhotos, type CaseThumb } from './first-photos.ts';
import {
  unsafeReadFacts,
  type CaseEstimate,
  type CaseRest,
  type StateColumns,
} from './read-facts.ts';

/** One of a customer's cases: where the instrument is now, without a word of any draft. */
export interface OwnCase {
  number: string;
  kind: string;
  maker: string;
  serial: string | null;
  takenInAt: Date;
  promisedOn: string | null;
  closedAt: Date | null;
  handedBackAt: Date | null;
  /** Whether proof of ownership is asked for; not why. */
  asksForProof: boolean;
  state: CaseStateNow;
  rests: CaseRest[];
  estimate: CaseEstimate | null;
  version: string;
  thumb: CaseThumb | null;
}

interface Row
  extends
    Omit<OwnCase, 'number' | 'asksForProof' | 'state' | 'rests' | 'estimate' | 'thumb'>,
    StateColumns {
  year: number;
  ordinal: number;
}

/**
 * Reads a customer's cases within their scope, newest first; of one number when `only` says so. Five
 * queries, however many cases. Never a word of a draft, a name of the staff's doing, or the next step.
 */
export async function readOwnCases(
  viewer: Viewer,
  only: { year: number; ordinal: number } | null,
  { now }: { now: Date },
): Promise<OwnCase[]> {
  demand(viewer, 'see cases', { own: true });
  if (viewer.kind !== 'customer') throw new NotAllowed();
  const scope = caseScope(viewer);
  const rows = await select<Row>(
    `SELECT c.id, c.year, c.ordinal, c.version, c.taken_in_at AS takenInAt,
            c.promised_on AS promisedOn, c.on_hold AS onHold, c.closed_at AS closedAt,
            c.handed_back_at AS handedBackAt, i.kind, i.maker, i.serial
     FROM cases c JOIN instruments i ON i.id = c.instrument_id
     WHERE ${scope.sql} ${only ? 'AND c.year = :year AND c.ordinal = :ordinal' : ''}
     ORDER BY c.handed_back_at IS NOT NULL, c.year DESC, c.ordinal DESC`,
    { ...scope.params, ...only },
  );
  const ids = rows.map(({ id }) => id);
  const [facts, thumbs] = await Promise.all([
    unsafeReadFacts(rows, { now }),
    unsafeFirstPhotos(ids, { ownersOnly: true }),
  ]);
  return rows.flatMap(({ id, year, ordinal, onHold, ...row }) => {
    const known = facts.get(id);
    if (!known) return [];
    const { state, rests, estimate } = known;
    return {
      ...row,
      number: formatCaseNumber({ year, ordinal }),
      asksForProof: onHold !== null,
      state,
      rests,
      estimate,
      thumb: thumbs.get(id) ?? null,
    };
  });
}
