import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import type { NodeReader } from '#evidence/merkle/node-reader.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';

/** A tree of invented leaves for tests, stored as a server stores it, that counts what is read. */
export function growTree(size: number) {
  const nodes = new Map<string, Uint8Array>();
  const leaves: Uint8Array[] = [];
  const counts = { reads: 0 };
  const read: NodeReader = (level, index) => {
    counts.reads += 1;
    const hash = nodes.get(`${level}/${index}`);
    if (!hash) throw new Error(`Node ${level}/${index} is not stored.`);
    return hash;
  };
  for (let index = 0; index < size; index += 1) {
    const leaf = leafHash(toUtf8(`leaf ${index}`));
    leaves.push(leaf);
    for (const node of nodesOfAppend(index, leaf, read)) {
      nodes.set(`${node.level}/${node.index}`, node.hash);
    }
  }
  return { nodes, leaves, read, counts };
}
