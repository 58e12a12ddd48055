import { equal } from '#evidence/bytes/equal.ts';
import { nodeHash } from '#evidence/merkle/node-hash.ts';

/**
 * Whether a proof shows that a leaf stands at `index` in the tree of that size and root
 * (RFC 9162 §2.1.3.2). Never throws: a malformed proof proves nothing.
 */
export function verifyInclusion(claim: {
  index: number;
  size: number;
  leafHash: Uint8Array;
  proof: readonly Uint8Array[];
  root: Uint8Array;
}): boolean {
  const { index, size, leafHash, proof, root } = claim;
  if (!Number.isSafeInteger(index) || !Number.isSafeInteger(size)) return false;
  if (index < 0 || index >= size) return false;
  if (![leafHash, root, ...proof].every((hash) => hash.length === 32)) return false;

  let node = index;
  let last = size - 1;
  let hash = leafHash;
  for (const sibling of proof) {
    if (last === 0) return false;
    if (node % 2 === 1 || node === last) {
      hash = nodeHash(sibling, hash);
      // A last node without a neighbour is its parent; go up until it has one.
      while (node % 2 === 0 && node !== 0) [node, last] = [node / 2, Math.floor(last / 2)];
    } else {
      hash = nodeHash(hash, sibling);
    }
    [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
  }
  return last === 0 && equal(hash, root);
}
