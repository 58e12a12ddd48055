import { parseCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '../db/sql.ts';
import { jobSentence } from './job-sentence.ts';

/** Something slow or outside that has not been done yet, or never will by itself. */
export interface Trouble {
  /** What is wrong, then what to do. */
  sentence: string;
  since: Date;
  givenUp: boolean;
}

interface Row {
  kind: string;
  last_error: string;
  created_at: Date;
  failed_at: Date | null;
}

const FAILING = `
  SELECT o.kind, o.last_error, o.created_at, o.failed_at FROM outbox o
  LEFT JOIN cases c ON c.id = o.case_id
  WHERE o.done_at IS NULL AND o.last_error IS NOT NULL
    AND (:year IS NULL OR (c.year = :year AND c.ordinal = :ordinal))
  ORDER BY o.failed_at IS NULL, o.created_at LIMIT 20`;

/**
 * What fails behind the scenes, of one case or (`number` null) of the whole shop: the twenty oldest,
 * those given up first. For staff only.
 */
export async function listTrouble(
  viewer: Viewer,
  { number }: { number: string | null },
): Promise<Trouble[]> {
  demand(viewer, 'take in');
  const parsed = number === null ? { year: null, ordinal: null } : parseCaseNumber(number);
  if (parsed === null) throw new NotFound();
  const rows = await select<Row>(FAILING, { ...parsed });
  return rows.map(({ kind, last_error: code, created_at: since, failed_at: failedAt }) => ({
    sentence: jobSentence(kind, code, failedAt !== null),
    since,
    givenUp: failedAt !== null,
  }));
}
