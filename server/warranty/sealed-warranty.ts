import { fromHex } from '#evidence/bytes/hex.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { select } from '#server/db/sql.ts';
import type { Warranty } from './warranty.ts';

/** A warranty that stands in the log. */
export interface SealedWarranty extends Warranty {
  jws: string;
  seal: Buffer;
  leafIndex: number;
  /** C of its entry, 32 bytes. */
  commitment: Buffer;
  /** Place of the close it names: its record begins there. */
  closeSeq: number;
}

/** Adds what the log knows of a sealed warranty. @throws Error before it is sealed */
export async function sealedWarranty(warranty: Warranty): Promise<SealedWarranty> {
  const { jws, seal, leafIndex } = warranty;
  if (jws === null || seal === null || leafIndex === null) {
    throw new Error('This warranty is not sealed yet.');
  }
  const [row] = await select<{ commitment: Buffer; header: Buffer }>(
    'SELECT commitment, header FROM sealed_entries WHERE leaf_index = ?',
    [leafIndex],
  );
  const [close] = row ? readHeader(row.header).names : [];
  const [named] = close
    ? await select<{ seq: number }>('SELECT seq FROM sealed_entries WHERE commitment = ?', [
        Buffer.from(fromHex(close)),
      ])
    : [];
  if (!row || !named) throw new Error('The log lacks this warranty. Run npm run log:check.');
  return { ...warranty, jws, seal, leafIndex, commitment: row.commitment, closeSeq: named.seq };
}
