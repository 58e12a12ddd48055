import type { Phase, Visibility } from '#domain/entry-draft.ts';
import type { TimelinePin, TimelineRest } from '#domain/timeline.ts';
import type { Viewer } from '#domain/viewer.ts';
import { caseScope } from '#server/cases/case-scope.ts';
import { select } from '#server/db/sql.ts';

/** An entry's own row with the names of its people. */
export interface EntryRow {
  id: string;
  kind: string;
  phase: Phase;
  visibility: Visibility;
  amendsId: string | null;
  draft: string | null;
  occurredAt: Date | null;
  writtenAt: Date;
  writtenById: string | null;
  writtenBy: string | null;
  leafIndex: string | null;
  sealedAt: Date | null;
  sealedBy: string | null;
}

/** A photo linked to an entry. */
export interface LinkRow {
  linkId: string;
  entryId: string;
  visibility: Visibility;
  caption: string | null;
  id: string;
  n: number;
  state: 'waiting' | 'ready' | 'failed';
  failedBecause: string | null;
  width: number;
  height: number;
  placeholder: Buffer | null;
}

/** What a viewer may see of a timeline, as conditions on its rows. */
interface Sight {
  entries: string;
  links: string;
}

const sightOf = (viewer: Viewer): Sight =>
  viewer.kind === 'staff'
    ? { entries: 'TRUE', links: 'TRUE' }
    : {
        entries: "e.visibility = 'shared' AND e.leaf_index IS NOT NULL",
        links: "l.visibility = 'shared'",
      };

/** Kinds that change what other entries show, and are no story of their own. */
const UNSEEN = "('visibility', 'paper', 'standing', 'erased', 'rest-override')";

/** The entries of a case that the viewer may see, oldest first, in the order in which they came in. */
export function readEntryRows(viewer: Viewer, caseId: string): Promise<EntryRow[]> {
  const scope = caseScope(viewer);
  return select<EntryRow>(
    `SELECT e.id, e.kind, e.phase, e.visibility, e.amends_id AS amendsId, e.draft,
            e.occurred_at AS occurredAt, e.written_at AS writtenAt, e.written_by AS writtenById,
            w.name AS writtenBy, e.leaf_index AS leafIndex, e.sealed_at AS sealedAt,
            s.name AS sealedBy
     FROM entries e
     JOIN cases c ON c.id = e.case_id
     LEFT JOIN people w ON w.id = e.written_by
     LEFT JOIN people s ON s.id = e.sealed_by
     WHERE e.case_id = :caseId AND e.kind NOT IN ${UNSEEN}
       AND ${sightOf(viewer).entries} AND ${scope.sql}
     ORDER BY e.written_at, e.id`,
    { ...scope.params, caseId },
  );
}

/** The photos of entries that the viewer may see, by number. `entryIds` are within their sight already. */
export function readLinkRows(viewer: Viewer, entryIds: string[]): Promise<LinkRow[]> {
  return select<LinkRow>(
    `SELECT l.id AS linkId, l.entry_id AS entryId, l.visibility, l.caption, f.id, f.number AS n,
            f.state, f.failed_because AS failedBecause, f.width, f.height, f.placeholder
     FROM entry_photos l JOIN photos f ON f.id = l.photo_id
     WHERE l.entry_id IN (?) AND ${sightOf(viewer).links}
     ORDER BY f.number`,
    [entryIds],
  );
}

/** The pins of drafts; a sealed entry's are in its part. Unscoped: for entries within sight. */
export function unsafePinRows(entryIds: string[]): Promise<(TimelinePin & { linkId: string })[]> {
  return select(
    `SELECT p.entry_photo_id AS linkId, p.number AS n, p.kind, p.x, p.y, p.label, p.note
     FROM pins p JOIN entry_photos l ON l.id = p.entry_photo_id
     WHERE l.entry_id IN (?) ORDER BY p.number`,
    [entryIds],
  );
}

/** The rests that entries began. Unscoped: for entries within sight. */
export function unsafeRestRows(
  entryIds: string[],
): Promise<(TimelineRest & { entryId: string })[]> {
  return select(
    `SELECT entry_id AS entryId, product, started_at AS startedAt, clamps_off_at AS clampsOffAt,
            worked_at AS workedAt, strings_at AS stringsAt
     FROM rests WHERE entry_id IN (?)`,
    [entryIds],
  );
}
