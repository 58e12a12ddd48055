import { caseState, type CaseStateNow } from '#domain/case-state.ts';
import type { RestFacts } from '#domain/rest-times.ts';
import { select } from '#server/db/sql.ts';

/** The columns of a case that its state follows from. */
export interface StateColumns {
  id: string;
  onHold: string | null;
  closedAt: Date | null;
  handedBackAt: Date | null;
}

/** A rest and what rests. */
export interface CaseRest extends RestFacts {
  product: string;
}

/** The newest revision of a case's estimate. */
export interface CaseEstimate {
  id: string;
  revision: number;
  summary: string;
  /** With tax, minor units, digits. */
  totalMinor: string;
  currency: string;
  sentAt: Date;
  answer: 'authorised' | 'declined' | null;
  answeredAt: Date | null;
}

/** What is known of a case beside its own row. */
export interface CaseKnown {
  state: CaseStateNow;
  rests: CaseRest[];
  estimate: CaseEstimate | null;
  /** When something was last added to the timeline. */
  lastAddedAt: Date | null;
  /** Name of whoever closed it, newest close. */
  closedBy: string | null;
}

type OfCase<Row> = Row & { caseId: string };

const readRests = (ids: string[]) =>
  select<OfCase<CaseRest>>(
    `SELECT case_id AS caseId, product, started_at AS startedAt, clamps_off_at AS clampsOffAt,
            worked_at AS workedAt, strings_at AS stringsAt
     FROM rests WHERE case_id IN (?) ORDER BY started_at`,
    [ids],
  );

const readEstimates = (ids: string[]) =>
  select<OfCase<CaseEstimate>>(
    `SELECT e.case_id AS caseId, e.id, e.revision, e.summary, e.total_minor AS totalMinor, e.currency,
            e.sent_at AS sentAt, e.answer, e.answered_at AS answeredAt
     FROM estimates e
     WHERE e.case_id IN (?)
       AND e.revision = (SELECT MAX(x.revision) FROM estimates x WHERE x.case_id = e.case_id)`,
    [ids],
  );

const readEntries = (ids: string[]) =>
  select<{ caseId: string; lastAddedAt: Date; closedBy: string | null }>(
    `SELECT e.case_id AS caseId, MAX(e.written_at) AS lastAddedAt,
            (SELECT p.name FROM entries k JOIN people p ON p.id = k.sealed_by
             WHERE k.case_id = e.case_id AND k.kind = 'close'
             ORDER BY k.leaf_index DESC LIMIT 1) AS closedBy
     FROM entries e WHERE e.case_id IN (?) GROUP BY e.case_id`,
    [ids],
  );

/**
 * Reads what the state of each case follows from: three queries, however many cases. Unscoped: the
 * caller has already found the cases within the viewer's scope.
 */
export async function unsafeReadFacts(
  cases: readonly StateColumns[],
  { now }: { now: Date },
): Promise<Map<string, CaseKnown>> {
  const ids = cases.map(({ id }) => id);
  const [rests, estimates, entries] = await Promise.all([
    readRests(ids),
    readEstimates(ids),
    readEntries(ids),
  ]);
  return new Map(
    cases.map(({ id, onHold, closedAt, handedBackAt }) => {
      const own = rests.filter(({ caseId }) => caseId === id);
      const estimate = estimates.find(({ caseId }) => caseId === id) ?? null;
      const entry = entries.find(({ caseId }) => caseId === id);
      const lastAddedAt = entry?.lastAddedAt ?? null;
      const openEstimate = estimate && estimate.answer === null ? estimate : null;
      const state = caseState({
        closedAt,
        handedBackAt,
        onHold,
        rests: own,
        openEstimate,
        lastAddedAt,
        now,
      });
      const closedBy = entry?.closedBy ?? null;
      return [id, { state, rests: own, estimate, lastAddedAt, closedBy }] as const;
    }),
  );
}
