import { Conflict } from '#domain/errors.ts';
import type { PhotoWords } from '#evidence/chain/entry-shown.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { select, type Transaction } from '#server/db/sql.ts';
import type { DraftToSeal } from './draft-to-seal.ts';
import { readSealedBench, readSealedShown } from './read-sealed.ts';

/** What a correction builds on: the entry it names, and what is already said about its photos. */
export interface CorrectedEntry {
  /** C of the original. */
  commitment: Buffer;
  photos: PhotoWords[];
}

/**
 * Reads the entry that an amendment corrects, as earlier amendments have left it.
 * @throws Conflict when the amendment lists a photo that the entry has already
 */
export async function correctedEntry(
  tx: Transaction,
  amendment: DraftToSeal,
): Promise<CorrectedEntry> {
  const rows = await select<{ leaf_index: string; commitment: Buffer; header: Buffer }>(
    `SELECT s.leaf_index, s.commitment, s.header FROM entries e
     JOIN sealed_entries s ON s.leaf_index = e.leaf_index
     WHERE e.id = :id OR e.amends_id = :id ORDER BY s.seq`,
    { id: amendment.amendsId },
    tx,
  );
  const [original] = rows;
  if (!original) throw new Error('A correction names an entry that is not sealed.');
  const taken = new Set(rows.flatMap(({ header }) => readHeader(header).photos.map(({ n }) => n)));
  const twice = amendment.photos.find(({ n }) => taken.has(n));
  if (twice) {
    throw new Conflict(
      `Photo ${twice.n} stands in the entry already. Take it off the correction, then seal it.`,
    );
  }
  const latest = Number((rows.at(-1) ?? original).leaf_index);
  const shown = (await readSealedShown([latest], tx)).get(latest)?.body;
  const bench = (await readSealedBench([latest], tx)).get(latest)?.body;
  return { commitment: original.commitment, photos: (shown ?? bench)?.photos ?? [] };
}
