import { toInstant } from '#evidence/bytes/instant.ts';
import type { Header } from '#evidence/seal/header.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { select } from '#server/db/sql.ts';
import { sameBytes, type Differences } from './differences.ts';
import type { SeenVisibility } from './seen-visibility.ts';

interface Row {
  leaf_index: string;
  header: Buffer;
  chain: Buffer;
  entry_id: string | null;
  kind: string;
  visibility: 'shared' | 'bench';
  sealed_at: Date | null;
  occurred_at: Date | null;
  record: Buffer | null;
  amended: Buffer | null;
}

interface LinkRow {
  leaf_index: string;
  n: number;
  visibility: 'shared' | 'bench';
}

const ROWS = `
  SELECT s.leaf_index, s.header, s.chain, e.id AS entry_id, e.kind, e.visibility, e.sealed_at,
         e.occurred_at, c.record, a.commitment AS amended
  FROM sealed_entries s
  LEFT JOIN entries e ON e.leaf_index = s.leaf_index
  LEFT JOIN cases c ON c.id = e.case_id
  LEFT JOIN entries o ON o.id = e.amends_id
  LEFT JOIN sealed_entries a ON a.leaf_index = o.leaf_index
  WHERE s.chain <> UNHEX(REPEAT('00', 16)) AND s.leaf_index >= ? AND s.leaf_index < ?
  ORDER BY s.leaf_index`;
const LINKS = `
  SELECT e.leaf_index, f.number AS n, l.visibility
  FROM entries e JOIN entry_photos l ON l.entry_id = e.id JOIN photos f ON f.id = l.photo_id
  WHERE e.leaf_index >= ? AND e.leaf_index < ?`;

function headerOf(bytes: Buffer): Header | null {
  try {
    return readHeader(bytes);
  } catch {
    // That the header cannot be read is said where the leaf is checked.
    return null;
  }
}

function checkRow(row: Row, seen: SeenVisibility, found: Differences): void {
  const leaf = Number(row.leaf_index);
  const which = `leaf ${leaf}`;
  found.seen('timeline rows');
  if (row.entry_id === null) return found.add('entries', which, 'no row shows this sealed entry');
  const header = headerOf(row.header);
  if (!header) return;
  const sealedAt = row.sealed_at && toInstant(row.sealed_at);
  const amends = row.amended && row.amended.toString('hex');
  // What is for the bench only tells no time in its header.
  const occurred = row.occurred_at && toInstant(row.occurred_at);
  const columns: [string, boolean][] = [
    ['kind', row.kind === header.kind],
    ['case_id or cases.record', sameBytes(row.record, row.chain)],
    ['sealed_at', sealedAt === header.recordedAt],
    ['occurred_at', header.visibility === 'bench' || occurred === header.occurredAt],
    ['visibility', row.visibility === seen.byLeaf.get(leaf)?.entry],
    ['amends_id', header.kind !== 'amendment' || amends === header.names[0]],
  ];
  for (const [column, same] of columns) {
    found.expect(same, `entries.${column}`, which, 'is not what was sealed');
  }
}

/** Holds the timeline's rows of leaves `from` to `to` (not included) against what was sealed. */
export async function checkTimeline(
  from: number,
  to: number,
  seen: SeenVisibility,
  found: Differences,
): Promise<void> {
  const [rows, links] = await Promise.all([
    select<Row>(ROWS, [from, to]),
    select<LinkRow>(LINKS, [from, to]),
  ]);
  for (const row of rows) checkRow(row, seen, found);
  for (const { leaf_index, n, visibility } of links) {
    const same = seen.byLeaf.get(Number(leaf_index))?.photos.get(n) === visibility;
    const which = `leaf ${leaf_index}, photo ${n}`;
    found.expect(same, 'entry_photos.visibility', which, 'is not what was sealed');
  }
}
