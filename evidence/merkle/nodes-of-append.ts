import { nodeHash } from '#evidence/merkle/node-hash.ts';
import type { NodeReader, TreeNode } from '#evidence/merkle/node-reader.ts';

/**
 * The nodes that a new leaf completes: the leaf's own first, then each subtree whose last leaf it
 * is, upwards. Storing them is all an append does to the tree.
 * @param index the new leaf's index, which is the size of the tree before it
 * @param read gives the left neighbours; at most log2(index + 1) are read
 */
export function nodesOfAppend(index: number, leafHash: Uint8Array, read: NodeReader): TreeNode[] {
  const nodes: TreeNode[] = [{ level: 0, index, hash: leafHash }];
  let last = nodes[0]!;
  while (last.index % 2 === 1) {
    const hash = nodeHash(read(last.level, last.index - 1), last.hash);
    last = { level: last.level + 1, index: (last.index - 1) / 2, hash };
    nodes.push(last);
  }
  return nodes;
}
