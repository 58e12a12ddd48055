import { ProofError } from '#evidence/errors.ts';
import type { NodeReader } from '#evidence/merkle/node-reader.ts';
import { splitOf, subtreeHash } from '#evidence/merkle/subtree-hash.ts';

/**
 * Proof that the tree with `second` leaves begins with the tree of `first` leaves: PROOF of
 * RFC 9162 §2.1.4.1. Empty for two equal sizes. At most 2 · log2(second) + 2 nodes are read.
 * @throws ProofError when first is 0 (every tree begins with the empty one) or above second
 */
export function proveConsistency(first: number, second: number, read: NodeReader): Uint8Array[] {
  if (!Number.isSafeInteger(first) || !Number.isSafeInteger(second) || first < 1) {
    throw new ProofError('A consistency proof is between two trees that have leaves.');
  }
  if (first > second) throw new ProofError(`A tree of ${second} leaves never had ${first}.`);
  const proof: Uint8Array[] = [];
  let [start, end] = [0, second];
  while (end !== first) {
    const middle = start + splitOf(end - start);
    const left = first <= middle;
    proof.unshift(left ? subtreeHash(middle, end, read) : subtreeHash(start, middle, read));
    [start, end] = left ? [start, middle] : [middle, end];
  }
  // The old tree's own root is known to whoever asks, unless it was split on the way.
  if (start > 0) proof.unshift(subtreeHash(start, end, read));
  return proof;
}
