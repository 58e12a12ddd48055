import { hashLines, readProofText } from '#evidence/proof/hash-lines.ts';

/** Proof that a log grew: the old size, the consistency proof, the newer checkpoint as text. */
export type ConsistencyText = { old: number; hashes: Uint8Array[]; checkpoint: string };

/** The proof as text, in the form a witness is asked to cosign (C2SP tlog-witness). */
export function writeConsistency({ old, hashes, checkpoint }: ConsistencyText): string {
  return `old ${old}\n${hashLines(hashes)}\n${checkpoint}`;
}

/**
 * Reads such a text. Neither the checkpoint's signature nor the proof is checked by it.
 * @throws ProofError when the text is not so
 */
export function readConsistency(text: string): ConsistencyText {
  const { number, hashes, checkpoint } = readProofText(text, 'old');
  return { old: number, hashes, checkpoint };
}
