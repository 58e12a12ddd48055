import { select } from '#server/db/sql.ts';

/** A leaf with its sealed entry, as the database has them. */
export interface LeafRow {
  leafIndex: number;
  entry: Buffer;
  chain: Buffer | null;
  seq: number | null;
  kind: string | null;
  header: Buffer | null;
  headerSalt: Buffer | null;
  commitment: Buffer | null;
  recordedAt: Date | null;
  parts: PartRow[];
  photos: PhotoRow[];
}

export interface PartRow {
  leafIndex: string;
  name: string;
  bytes: Buffer | null;
  salt: Buffer | null;
}

export interface PhotoRow {
  leafIndex: string;
  n: number;
  visibility: 'shared' | 'bench';
  originalSalt: Buffer | null;
  publishedSalt: Buffer | null;
  original: Buffer;
  published: Buffer | null;
}

const LEAVES = `
  SELECT l.leaf_index AS leafIndex, l.entry, s.chain, s.seq, s.kind, s.header,
         s.header_salt AS headerSalt, s.commitment, s.recorded_at AS recordedAt
  FROM log_leaves l LEFT JOIN sealed_entries s ON s.leaf_index = l.leaf_index
  WHERE l.leaf_index >= ? AND l.leaf_index < ? ORDER BY l.leaf_index`;
const PARTS = `
  SELECT leaf_index AS leafIndex, name, bytes, salt FROM sealed_parts
  WHERE leaf_index >= ? AND leaf_index < ?`;
const PHOTOS = `
  SELECT e.leaf_index AS leafIndex, f.number AS n, l.visibility, l.original_salt AS originalSalt,
         l.published_salt AS publishedSalt, f.sha256 AS original, c.sha256 AS published
  FROM entries e
  JOIN entry_photos l ON l.entry_id = e.id
  JOIN photos f ON f.id = l.photo_id
  LEFT JOIN photo_copies c ON c.photo_id = f.id AND c.edge = 2048
  WHERE e.leaf_index >= ? AND e.leaf_index < ? ORDER BY f.number`;

function byLeaf<Row extends { leafIndex: string }>(rows: Row[]): Map<number, Row[]> {
  const groups = new Map<number, Row[]>();
  for (const row of rows) {
    const leaf = Number(row.leafIndex);
    groups.set(leaf, [...(groups.get(leaf) ?? []), row]);
  }
  return groups;
}

/** The leaves from index `from` up to but not including `to`, with their entries, parts and photos. */
export async function leafRows(from: number, to: number): Promise<LeafRow[]> {
  const range = [from, to];
  const [leaves, partRows, photoRows] = await Promise.all([
    select<Omit<LeafRow, 'leafIndex' | 'parts' | 'photos'> & { leafIndex: string }>(LEAVES, range),
    select<PartRow>(PARTS, range),
    select<PhotoRow>(PHOTOS, range),
  ]);
  const [parts, photos] = [byLeaf(partRows), byLeaf(photoRows)];
  return leaves.map((leaf) => {
    const leafIndex = Number(leaf.leafIndex);
    return {
      ...leaf,
      leafIndex,
      parts: parts.get(leafIndex) ?? [],
      photos: photos.get(leafIndex) ?? [],
    };
  });
}
