import { sha256 } from '#evidence/bytes/sha256.ts';
import { nodeHash } from '#evidence/merkle/node-hash.ts';

/**
 * Root over all leaf hashes, RFC 9162 §2.1.1, with nothing stored: what somebody does who holds
 * the public entries and trusts no node of anybody's.
 */
export function rootOfLeaves(leafHashes: readonly Uint8Array[]): Uint8Array {
  if (leafHashes.length === 0) return sha256();
  let row = [...leafHashes];
  while (row.length > 1) {
    const above: Uint8Array[] = [];
    for (let at = 0; at < row.length; at += 2) {
      const right = row[at + 1];
      // An odd last node goes up unhashed: that is what RFC 9162's uneven split comes to.
      above.push(right ? nodeHash(row[at]!, right) : row[at]!);
    }
    row = above;
  }
  return row[0]!;
}
