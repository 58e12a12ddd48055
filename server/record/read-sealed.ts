import type { PartValue } from '#evidence/chain/part-schema.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import type { EntryBody, PhotoWords } from '#evidence/chain/entry-shown.ts';
import type { CaseKind } from '#evidence/seal/kinds.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** What may be shown of a sealed entry of a case. */
export interface SealedShown {
  leafIndex: number;
  seq: number;
  kind: CaseKind;
  recordedAt: Date;
  /** Leaf hash, 64 hex digits: what papers and people call the entry by. */
  leafHash: string;
  /** The story of an entry, amendment, inspection or incident; null for other kinds and for one that is for the bench only. */
  body: EntryBody | null;
  /** The one text of an authorisation, close, hand-back or claim; null for other kinds. */
  text: string | null;
}

/** What stays in the shop of a sealed entry. */
export interface SealedBench {
  note: string;
  minutes: number | null;
  /** The story of an entry for the bench only; null where it is in what may be shown. */
  body: EntryBody | null;
  /** What is said about the bench photos of a shared entry. */
  photos: PhotoWords[];
}

interface Row {
  leaf_index: string;
  seq: number;
  kind: CaseKind;
  recorded_at: Date;
  entry: Buffer;
  bytes: Buffer | null;
}

const rowsOf = (part: 'shown' | 'bench', leafIndexes: number[], tx?: Transaction) =>
  select<Row>(
    `SELECT s.leaf_index, s.seq, s.kind, s.recorded_at, l.entry, p.bytes
     FROM sealed_entries s
     JOIN log_leaves l ON l.leaf_index = s.leaf_index
     LEFT JOIN sealed_parts p ON p.leaf_index = s.leaf_index AND p.name = ?
     WHERE s.leaf_index IN (?)`,
    [part, leafIndexes],
    tx,
  );

type ShownOfCase = { [K in CaseKind]: PartValue<K, 'shown'> }[CaseKind];

function shownOf({ kind, bytes }: Row): Pick<SealedShown, 'body' | 'text'> {
  if (!bytes) return { body: null, text: null };
  const shown = readPart(kind, 'shown', bytes) as ShownOfCase;
  if (shown.v === 2) {
    const { v: _form, ...body } = shown;
    return { body, text: null };
  }
  return { body: null, text: 'text' in shown ? shown.text : null };
}

/**
 * Reads what may be shown of sealed entries, by leaf index. Who may see an entry is for the caller.
 * One query, however many.
 */
export async function readSealedShown(
  leafIndexes: number[],
  tx?: Transaction,
): Promise<Map<number, SealedShown>> {
  const rows = await rowsOf('shown', leafIndexes, tx);
  return new Map(
    rows.map((row) => [
      Number(row.leaf_index),
      {
        leafIndex: Number(row.leaf_index),
        seq: row.seq,
        kind: row.kind,
        recordedAt: row.recorded_at,
        leafHash: Buffer.from(leafHash(row.entry)).toString('hex'),
        ...shownOf(row),
      },
    ]),
  );
}

/**
 * Reads what stays in the shop of sealed entries, by leaf index; entries without such a part are not
 * in the result. For the shop's people only.
 */
export async function readSealedBench(
  leafIndexes: number[],
  tx?: Transaction,
): Promise<Map<number, SealedBench>> {
  const rows = await rowsOf('bench', leafIndexes, tx);
  return new Map(
    rows.flatMap(({ leaf_index, kind, bytes }) => {
      if (!bytes) return [];
      const { text: note, minutes, ...rest } = readPart(kind, 'bench', bytes);
      const { entry: body, photos } = 'entry' in rest ? rest : { entry: null, photos: [] };
      return [[Number(leaf_index), { note, minutes, body, photos }] as const];
    }),
  );
}
