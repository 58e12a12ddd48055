import { equal } from '#evidence/bytes/equal.ts';
import { nodeHash } from '#evidence/merkle/node-hash.ts';

/**
 * Whether a proof shows that the tree of size `second` begins with the tree of size `first`
 * (RFC 9162 §2.1.4.2). Never throws: a malformed proof proves nothing.
 */
export function verifyConsistency(claim: {
  first: number;
  second: number;
  firstRoot: Uint8Array;
  secondRoot: Uint8Array;
  proof: readonly Uint8Array[];
}): boolean {
  const { first, second, firstRoot, secondRoot, proof } = claim;
  if (!Number.isSafeInteger(first) || !Number.isSafeInteger(second)) return false;
  if (first < 1 || first > second) return false;
  if (![firstRoot, secondRoot, ...proof].every((hash) => hash.length === 32)) return false;
  if (first === second) return proof.length === 0 && equal(firstRoot, secondRoot);

  let node = first - 1;
  let last = second - 1;
  while (node % 2 === 1) [node, last] = [(node - 1) / 2, Math.floor(last / 2)];
  // Where the old tree is one complete subtree its root starts the walk and is left out.
  const [start, ...path] = node === 0 ? [firstRoot, ...proof] : proof;
  if (!start || (node === 0 && path.length === 0)) return false;

  let older = start;
  let newer = start;
  for (const sibling of path) {
    if (last === 0) return false;
    if (node % 2 === 1 || node === last) {
      older = nodeHash(sibling, older);
      newer = nodeHash(sibling, newer);
      while (node % 2 === 0 && node !== 0) [node, last] = [node / 2, Math.floor(last / 2)];
    } else {
      newer = nodeHash(newer, sibling);
    }
    [node, last] = [Math.floor(node / 2), Math.floor(last / 2)];
  }
  return last === 0 && equal(older, firstRoot) && equal(newer, secondRoot);
}
