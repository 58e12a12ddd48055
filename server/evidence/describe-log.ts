import { readPart } from '#evidence/chain/read-part.ts';
import type { LogKind } from '#evidence/seal/kinds.ts';
import { select } from '#server/db/sql.ts';
import { publicKeys, type PublicKey } from './current-key.ts';
import { readLogState } from './log-state.ts';
import { newestHead, type PublishedHead } from './newest-checkpoint.ts';
import { OWN_CHAIN } from './own-chain.ts';

/** A key with the time it was added at. */
export type DatedKey = PublicKey & { addedAt: Date };

/** An entry of the log's own chain, in short. */
export interface OwnEntry {
  leafIndex: number;
  kind: LogKind;
  recordedAt: Date;
  /** What a key leaf does to which key; null for other kinds. */
  key: { use: string; act: string; id: string } | null;
}

/** The witness log as anyone may know it. */
export interface LogDescription {
  origin: string;
  head: PublishedHead | null;
  keys: DatedKey[];
  own: OwnEntry[];
}

interface Row {
  leaf_index: string;
  kind: LogKind;
  recorded_at: Date;
  bytes: Buffer | null;
}

function keyOf({ kind, bytes }: Row): OwnEntry['key'] {
  if (kind !== 'key' || !bytes) return null;
  const { use, act, id } = readPart('key', 'shown', bytes);
  return { use, act, id };
}

/** Describes the log: its name, newest head, keys, and own entries. Everything of it is open. */
export async function describeLog(): Promise<LogDescription> {
  const [{ origin }, head, keys, rows] = await Promise.all([
    readLogState(),
    newestHead(),
    publicKeys(),
    select<Row>(
      `SELECT s.leaf_index, s.kind, s.recorded_at, p.bytes FROM sealed_entries s
       LEFT JOIN sealed_parts p ON p.leaf_index = s.leaf_index AND p.name = 'shown'
       WHERE s.chain = ? ORDER BY s.seq`,
      [OWN_CHAIN],
    ),
  ]);
  const own = rows.map((row) => ({
    leafIndex: Number(row.leaf_index),
    kind: row.kind,
    recordedAt: row.recorded_at,
    key: keyOf(row),
  }));
  const at = new Map(own.map(({ leafIndex, recordedAt }) => [leafIndex, recordedAt]));
  return {
    origin,
    head,
    keys: keys.map((key) => ({ ...key, addedAt: at.get(key.addedAtLeaf) ?? new Date(0) })),
    own,
  };
}
