import { parseCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { TimelineEntry, TimelinePhoto, TimelinePin } from '#domain/timeline.ts';
import type { Viewer } from '#domain/viewer.ts';
import { caseScope } from '#server/cases/case-scope.ts';
import { select } from '#server/db/sql.ts';
import { readSealedBench, readSealedShown } from '#server/record/read-sealed.ts';
import { draftWords, sealedWords, type EntryWords } from './entry-words.ts';
import {
  readEntryRows,
  readLinkRows,
  unsafePinRows,
  unsafeRestRows,
  type EntryRow,
  type LinkRow,
} from './timeline-rows.ts';

async function caseIdOf(viewer: Viewer, caseNumber: string): Promise<string> {
  const number = parseCaseNumber(caseNumber);
  const scope = caseScope(viewer);
  const [row] = number
    ? await select<{ id: string }>(
        `SELECT c.id FROM cases c
         WHERE c.year = :year AND c.ordinal = :ordinal AND ${scope.sql}`,
        { ...scope.params, ...number },
      )
    : [];
  if (!row) throw new NotFound('No case has this number. Check it on the tag.');
  return row.id;
}

type PinRow = TimelinePin & { linkId: string };

function photoOf(link: LinkRow, words: EntryWords, pins: PinRow[]): TimelinePhoto {
  const sealed = words.photos?.get(link.n);
  const own = pins.filter(({ linkId }) => linkId === link.linkId);
  const { id, n, visibility, state, failedBecause, width, height } = link;
  return {
    ...{ id, n, visibility, state, failedBecause, width, height },
    caption: sealed?.caption ?? link.caption ?? '',
    placeholder: link.placeholder && link.placeholder.toString('base64'),
    pins: sealed?.pins ?? own.map(({ linkId: _link, ...pin }) => pin),
  };
}

function sealOf(row: EntryRow, leafHash: string | undefined): TimelineEntry['seal'] {
  if (row.sealedAt === null || leafHash === undefined) return null;
  return { at: row.sealedAt, by: row.sealedBy, leafHash };
}

/**
 * A case's timeline, oldest first: for the shop's people all of it, for a customer only sealed shared
 * entries with their shared photos, never a word of a draft or a bench note. At most seven queries,
 * however many entries and photos.
 * Throws NotFound for a number that is none, unknown, or not in the viewer's scope.
 */
export async function listTimeline(
  viewer: Viewer,
  { caseNumber }: { caseNumber: string },
): Promise<TimelineEntry[]> {
  demand(viewer, 'see cases', { own: true });
  const staff = viewer.kind === 'staff';
  const rows = await readEntryRows(viewer, await caseIdOf(viewer, caseNumber));
  const ids = rows.map(({ id }) => id);
  const leaves = rows.flatMap(({ leafIndex }) => (leafIndex === null ? [] : [Number(leafIndex)]));
  const [links, pins, rests, shown, bench] = await Promise.all([
    readLinkRows(viewer, ids),
    staff ? unsafePinRows(ids) : [],
    unsafeRestRows(ids),
    readSealedShown(leaves),
    staff ? readSealedBench(leaves) : new Map<number, never>(),
  ]);
  const words = rows.map(({ kind, draft, leafIndex }) =>
    draft === null
      ? sealedWords(kind, shown.get(Number(leafIndex)), bench.get(Number(leafIndex)))
      : draftWords(draft),
  );
  const titles = new Map(rows.map(({ id }, index) => [id, words[index]?.title ?? '']));
  return rows.flatMap((row, index) => {
    const said = words[index];
    if (!said) return [];
    const { photos: _sealed, ...shownWords } = said;
    const corrected = row.amendsId === null ? undefined : titles.get(row.amendsId);
    const rest = rests.find(({ entryId }) => entryId === row.id);
    return {
      id: row.id,
      kind: row.kind,
      phase: row.phase,
      visibility: row.visibility,
      ...shownWords,
      occurredAt: row.occurredAt,
      writtenAt: row.writtenAt,
      writtenBy: staff ? row.writtenBy : null,
      writtenById: staff ? row.writtenById : null,
      corrects:
        row.amendsId !== null && corrected !== undefined
          ? { id: row.amendsId, title: corrected }
          : null,
      rest: rest ? withoutEntry(rest) : null,
      photos: links
        .filter(({ entryId }) => entryId === row.id)
        .map((link) => photoOf(link, said, pins)),
      seal: sealOf(row, shown.get(Number(row.leafIndex))?.leafHash),
    };
  });
}

const withoutEntry = <Rest extends { entryId: string }>({ entryId: _entry, ...rest }: Rest) => rest;
