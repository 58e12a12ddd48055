import type { WrittenEntry } from '#evidence/seal/write-entry.ts';
import { run, type Transaction } from '#server/db/sql.ts';
import type { NewEntry } from './append-entry.ts';

interface Stored {
  leafIndex: number;
  seq: number;
  at: Date;
  entry: NewEntry;
  sealed: WrittenEntry;
  /** The header's. */
  salt: Buffer;
}

/** Writes a sealed entry's rows: the log entry itself, the header, and each part with its salt. */
export async function storeSealed(tx: Transaction, stored: Stored): Promise<void> {
  const { leafIndex, seq, at, entry, sealed, salt } = stored;
  await run(
    'INSERT INTO log_leaves (leaf_index, entry) VALUES (?, ?)',
    [leafIndex, Buffer.from(sealed.entry)],
    tx,
  );
  await run(
    `INSERT INTO sealed_entries
       (leaf_index, chain, seq, kind, header, header_salt, commitment, recorded_at)
     VALUES (?, ?, ?, ?, ?, ?, ?, ?)`,
    [
      leafIndex,
      Buffer.from(entry.chain),
      seq,
      entry.kind,
      Buffer.from(sealed.headerBytes),
      salt,
      Buffer.from(sealed.commitment),
      at,
    ],
    tx,
  );
  const parts = Object.entries(sealed.parts);
  if (parts.length === 0) return;
  await run(
    `INSERT INTO sealed_parts (leaf_index, name, bytes, salt)
     VALUES ${parts.map(() => '(?, ?, ?, ?)').join(', ')}`,
    parts.flatMap(([name, part]) => [
      leafIndex,
      name,
      Buffer.from(part.bytes),
      Buffer.from(part.salt),
    ]),
    tx,
  );
}
