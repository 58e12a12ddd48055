import { sha256 } from '#evidence/bytes/sha256.ts';
import type { NodeReader } from '#evidence/merkle/node-reader.ts';
import { subtreeHash } from '#evidence/merkle/subtree-hash.ts';

/**
 * Root of the tree with `size` leaves (RFC 9162 §2.1.1) from stored nodes; at most log2(size) + 1
 * of them are read. An empty tree's root is the hash of nothing.
 */
export function treeRoot(size: number, read: NodeReader): Uint8Array {
  return size === 0 ? sha256() : subtreeHash(0, size, read);
}
