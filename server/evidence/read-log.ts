import { select } from '#server/db/sql.ts';

/** Log entries from index `from` on, at most `count` of them, 65 bytes each. */
export async function readLogEntries(from: number, count: number): Promise<Buffer[]> {
  const rows = await select<{ entry: Buffer }>(
    'SELECT entry FROM log_leaves WHERE leaf_index >= ? AND leaf_index < ? ORDER BY leaf_index',
    [from, from + count],
  );
  return rows.map(({ entry }) => entry);
}
