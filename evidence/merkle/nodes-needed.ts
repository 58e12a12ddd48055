import type { NodeAddress, NodeReader } from '#evidence/merkle/node-reader.ts';

/**
 * Which stored nodes a computation will read, in order, each once: run it here first, fetch them
 * in one query, then run it again with what was fetched.
 * @param compute anything that reads nodes; which ones must not depend on their hashes
 * @example nodesNeeded((read) => proveInclusion(index, size, read))
 */
export function nodesNeeded(compute: (read: NodeReader) => unknown): NodeAddress[] {
  const needed = new Map<string, NodeAddress>();
  compute((level, index) => {
    needed.set(`${level}/${index}`, { level, index });
    return new Uint8Array(32);
  });
  return [...needed.values()];
}
