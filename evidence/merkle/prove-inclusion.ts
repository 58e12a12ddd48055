import { ProofError } from '#evidence/errors.ts';
import type { NodeReader } from '#evidence/merkle/node-reader.ts';
import { splitOf, subtreeHash } from '#evidence/merkle/subtree-hash.ts';

/**
 * Proof that the leaf at `index` is in the tree with `size` leaves: PATH of RFC 9162 §2.1.3.1,
 * from the leaf's sibling up. At most 2 · log2(size) + 1 nodes are read.
 * @throws ProofError when the tree of that size has no such leaf
 */
export function proveInclusion(index: number, size: number, read: NodeReader): Uint8Array[] {
  if (!Number.isSafeInteger(index) || !Number.isSafeInteger(size) || index < 0 || index >= size) {
    throw new ProofError(`A tree of ${size} leaves has no leaf ${index}.`);
  }
  const proof: Uint8Array[] = [];
  let [start, end] = [0, size];
  while (end - start > 1) {
    const middle = start + splitOf(end - start);
    const left = index < middle;
    proof.unshift(left ? subtreeHash(middle, end, read) : subtreeHash(start, middle, read));
    [start, end] = left ? [start, middle] : [middle, end];
  }
  return proof;
}
