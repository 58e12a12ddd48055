import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { ProofError } from '#evidence/errors.ts';
import { nodesNeeded } from '#evidence/merkle/nodes-needed.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';
import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { rootOfLeaves } from '#evidence/merkle/root-of-leaves.ts';
import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { verifyConsistency } from '#evidence/merkle/verify-consistency.ts';
import { verifyInclusion } from '#evidence/merkle/verify-inclusion.ts';
import { growTree } from '#tests/evidence/grow-tree.ts';

const LARGEST = 64;
const tree = growTree(LARGEST);
const sizes = Array.from({ length: LARGEST }, (_, at) => at + 1);

/** MTH of RFC 9162 §2.1.1, word for word, as a second way to the same root. */
function mth(leaves: Uint8Array[]): Uint8Array {
  if (leaves.length === 0) return sha256();
  if (leaves.length === 1) return leaves[0]!;
  let k = 1;
  while (k * 2 < leaves.length) k *= 2;
  return sha256(Uint8Array.of(1), mth(leaves.slice(0, k)), mth(leaves.slice(k)));
}
const roots = [0, ...sizes].map((size) => mth(tree.leaves.slice(0, size)));
const flip = (bytes: Uint8Array, bit: number) =>
  bytes.map((byte, at) => (at === bit >> 3 ? byte ^ (1 << (bit & 7)) : byte));

test('every root up to 64 leaves, from stored nodes and from leaves alone', () => {
  for (const size of [0, ...sizes]) {
    expect(toHex(treeRoot(size, tree.read))).toBe(toHex(roots[size]!));
    expect(toHex(rootOfLeaves(tree.leaves.slice(0, size)))).toBe(toHex(roots[size]!));
  }
});

test('an append stores the leaf and each subtree it completes, and nothing twice', () => {
  const nodes = nodesOfAppend(7, tree.leaves[7]!, tree.read);
  expect(nodes.map(({ level, index }) => `${level}/${index}`)).toEqual([
    '0/7',
    '1/3',
    '2/1',
    '3/0',
  ]);
  expect(toHex(nodes[3]!.hash)).toBe(toHex(roots[8]!));
  // A tree of 64 leaves has 64 + 32 + … + 1 complete subtrees.
  expect(tree.nodes.size).toBe(127);
});

describe('inclusion', () => {
  test('every leaf of every tree up to 64 is proven, and no other place', () => {
    for (const size of sizes) {
      for (let index = 0; index < size; index += 1) {
        const proof = proveInclusion(index, size, tree.read);
        const claim = { index, size, leafHash: tree.leaves[index]!, proof, root: roots[size]! };
        expect(verifyInclusion(claim)).toBe(true);
        expect(verifyInclusion({ ...claim, proof: [...proof, roots[1]!] })).toBe(false);
        if (size === 1) continue;
        expect(verifyInclusion({ ...claim, index: (index + 1) % size })).toBe(false);
        expect(verifyInclusion({ ...claim, proof: proof.slice(1) })).toBe(false);
      }
    }
  });

  test('every flipped bit is refused', () => {
    const proof = proveInclusion(5, 11, tree.read);
    const claim = { index: 5, size: 11, leafHash: tree.leaves[5]!, proof, root: roots[11]! };
    for (let bit = 0; bit < 256; bit += 1) {
      expect(verifyInclusion({ ...claim, leafHash: flip(claim.leafHash, bit) })).toBe(false);
      expect(verifyInclusion({ ...claim, root: flip(claim.root, bit) })).toBe(false);
      for (const at of proof.keys()) {
        const damaged = proof.with(at, flip(proof[at]!, bit));
        expect(verifyInclusion({ ...claim, proof: damaged })).toBe(false);
      }
    }
  });

  test('what no tree has is refused in words', () => {
    expect(() => proveInclusion(3, 3, tree.read)).toThrow(ProofError);
    expect(() => proveInclusion(-1, 3, tree.read)).toThrow(ProofError);
    expect(() => proveInclusion(0.5, 3, tree.read)).toThrow(ProofError);
  });
});

describe('consistency', () => {
  test('every pair of sizes up to 64 is proven, and no other pair of roots', () => {
    for (const second of sizes) {
      for (let first = 1; first <= second; first += 1) {
        const proof = proveConsistency(first, second, tree.read);
        const claim = {
          first,
          second,
          firstRoot: roots[first]!,
          secondRoot: roots[second]!,
          proof,
        };
        expect(verifyConsistency(claim)).toBe(true);
        const other = roots[first - 1]!;
        expect(verifyConsistency({ ...claim, firstRoot: other })).toBe(false);
        expect(verifyConsistency({ ...claim, secondRoot: flip(claim.secondRoot, 9) })).toBe(false);
        expect(verifyConsistency({ ...claim, proof: [...proof, other] })).toBe(false);
      }
    }
  });

  test('every flipped bit is refused', () => {
    const proof = proveConsistency(6, 13, tree.read);
    const claim = { first: 6, second: 13, firstRoot: roots[6]!, secondRoot: roots[13]!, proof };
    for (let bit = 0; bit < 256; bit += 1) {
      expect(verifyConsistency({ ...claim, firstRoot: flip(claim.firstRoot, bit) })).toBe(false);
      for (const at of proof.keys()) {
        const damaged = proof.with(at, flip(proof[at]!, bit));
        expect(verifyConsistency({ ...claim, proof: damaged })).toBe(false);
      }
    }
  });

  test('an empty old tree and a shrinking one have no proof', () => {
    expect(() => proveConsistency(0, 4, tree.read)).toThrow(ProofError);
    expect(() => proveConsistency(5, 4, tree.read)).toThrow(ProofError);
    const root = roots[4]!;
    const empty = { first: 0, second: 4, firstRoot: roots[0]!, secondRoot: root, proof: [] };
    expect(verifyConsistency(empty)).toBe(false);
    expect(verifyConsistency({ ...empty, first: 4, second: 3 })).toBe(false);
  });
});

test('the nodes needed are known beforehand and stay within 2 · log2(size) + 2', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 2 ** 40 }), fc.nat(), fc.nat(), (size, a, b) => {
      const most = 2 * Math.log2(size) + 2;
      expect(nodesNeeded((read) => proveInclusion(a % size, size, read)).length).toBeLessThan(most);
      const first = 1 + (b % size);
      expect(nodesNeeded((read) => proveConsistency(first, size, read)).length).toBeLessThan(most);
      expect(nodesNeeded((read) => nodesOfAppend(size - 1, roots[0]!, read)).length).toBeLessThan(
        most,
      );
    }),
  );
});

test('a proof made from only the nodes said to be needed is the same proof', () => {
  for (const size of sizes) {
    const needed = nodesNeeded((read) => proveInclusion(size >> 1, size, read));
    const rows = new Map(needed.map((n) => [`${n.level}/${n.index}`, tree.read(n.level, n.index)]));
    const proof = proveInclusion(size >> 1, size, (level, index) => rows.get(`${level}/${index}`)!);
    expect(proof.map(toHex)).toEqual(proveInclusion(size >> 1, size, tree.read).map(toHex));
  }
});
