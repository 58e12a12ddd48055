import { formatCaseNumber } from '#domain/case-number.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { unsafeFirstPhotos, type CaseThumb } from './first-photos.ts';
import { beginsWith, contains } from '#server/db/like.ts';
import { unsafeReadFacts, type CaseKnown, type StateColumns } from './read-facts.ts';

/** A case in the list of what was found. */
export interface FoundCase extends Pick<CaseKnown, 'state'> {
  number: string;
  kind: string;
  maker: string;
  serial: string | null;
  owner: string;
  job: string;
  takenInAt: Date;
  closedAt: Date | null;
  handedBackAt: Date | null;
  thumb: CaseThumb | null;
}

interface Row extends Omit<FoundCase, 'state' | 'number' | 'thumb'>, StateColumns {
  year: number;
  ordinal: number;
}

/** The most that are listed; with more, the search is to be narrowed. */
export const MOST_FOUND = 40;

/** "2026-031", "031" or "31" as year and ordinal; either may be left open. */
function asNumber(words: string): { year: number | null; ordinal: number | null } {
  const [, year, ordinal] = /^(?:([1-9]\d{3})\s*[-/ ]\s*)?0*(\d{1,9})$/.exec(words) ?? [];
  return { year: year ? Number(year) : null, ordinal: ordinal ? Number(ordinal) : null };
}

/**
 * Finds cases, open and closed, by number, the beginning of a serial, or a part of the owner's name,
 * the maker or the kind; newest first, at most MOST_FOUND. Nothing for no words. Five queries.
 */
export async function findCases(
  viewer: Viewer,
  { words }: { words: string },
  { now = new Date() } = {},
): Promise<FoundCase[]> {
  demand(viewer, 'see cases');
  const text = words.trim().slice(0, 160);
  if (text === '') return [];
  const rows = await select<Row>(
    `SELECT c.id, c.year, c.ordinal, c.job, c.taken_in_at AS takenInAt, c.on_hold AS onHold,
            c.closed_at AS closedAt, c.handed_back_at AS handedBackAt,
            i.kind, i.maker, i.serial, o.name AS owner
     FROM cases c
     JOIN instruments i ON i.id = c.instrument_id
     JOIN parties p ON p.case_id = c.id AND p.part = 'owner'
     JOIN customers o ON o.id = p.customer_id
     WHERE (c.ordinal = :ordinal AND (:year IS NULL OR c.year = :year))
        OR i.serial LIKE :beginning OR o.name LIKE :part OR i.maker LIKE :part OR i.kind LIKE :part
     ORDER BY c.year DESC, c.ordinal DESC LIMIT ${MOST_FOUND}`,
    { ...asNumber(text), beginning: beginsWith(text), part: contains(text) },
  );
  const ids = rows.map(({ id }) => id);
  const [facts, thumbs] = await Promise.all([
    unsafeReadFacts(rows, { now }),
    unsafeFirstPhotos(ids, { ownersOnly: false }),
  ]);
  return rows.flatMap(({ id, year, ordinal, onHold: _shown, ...row }) => {
    const known = facts.get(id);
    if (!known) return [];
    const number = formatCaseNumber({ year, ordinal });
    return { ...row, number, state: known.state, thumb: thumbs.get(id) ?? null };
  });
}
