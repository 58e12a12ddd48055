import { nodeHash } from '#evidence/merkle/node-hash.ts';
import type { NodeReader } from '#evidence/merkle/node-reader.ts';

/** The largest power of two below a size of at least 2. Not by bit shifts: those end at 2^31. */
export function splitOf(size: number): number {
  let split = 1;
  while (split * 2 < size) split *= 2;
  return split;
}

/**
 * Merkle tree hash over the leaves [start, end), RFC 9162 §2.1.1, from stored nodes.
 * @param start a multiple of the smallest power of two that holds the range, as the tree's own
 *   splits always are
 */
export function subtreeHash(start: number, end: number, read: NodeReader): Uint8Array {
  const size = end - start;
  const level = Math.log2(size);
  if (Number.isInteger(level)) return read(level, start / size);
  const middle = start + splitOf(size);
  return nodeHash(subtreeHash(start, middle, read), subtreeHash(middle, end, read));
}
