import type { Header } from '#evidence/seal/header.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** One entry of a chain: where it is, its commitment, its header. */
export interface ChainEntry {
  leafIndex: number;
  commitment: Buffer;
  header: Header;
}

/**
 * A chain's entries by seq, at most a thousand for a case.
 * @param record the case's record id, 16 bytes
 */
export async function chainOf(tx: Transaction, record: Buffer): Promise<ChainEntry[]> {
  const rows = await select<{ leaf_index: string; commitment: Buffer; header: Buffer }>(
    'SELECT leaf_index, commitment, header FROM sealed_entries WHERE chain = ? ORDER BY seq',
    [record],
    tx,
  );
  return rows.map(({ leaf_index, commitment, header }) => ({
    leafIndex: Number(leaf_index),
    commitment,
    header: readHeader(header),
  }));
}
