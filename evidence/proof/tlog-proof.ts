import { ProofError } from '#evidence/errors.ts';
import { hashLines, readProofText } from '#evidence/proof/hash-lines.ts';

const FIRST_LINE = 'c2sp.org/tlog-proof@v1\n';

/** Proof that a leaf is in a log: its index, the inclusion proof, a checkpoint as text. */
export type TlogProof = { index: number; hashes: Uint8Array[]; checkpoint: string };

/** The proof as text (C2SP tlog-proof), without an extra line; a file of it ends in .tlog-proof. */
export function writeTlogProof({ index, hashes, checkpoint }: TlogProof): string {
  return `${FIRST_LINE}index ${index}\n${hashLines(hashes)}\n${checkpoint}`;
}

/**
 * Reads a proof text. Neither the checkpoint's signature nor the proof is checked by it.
 * @throws ProofError when the text is not so; an extra line is refused, because nothing vouches
 *   for what stands in it
 */
export function readTlogProof(text: string): TlogProof {
  if (!text.startsWith(FIRST_LINE)) throw new ProofError('This is not the text of a proof.');
  const { number, hashes, checkpoint } = readProofText(text.slice(FIRST_LINE.length), 'index');
  return { index: number, hashes, checkpoint };
}
