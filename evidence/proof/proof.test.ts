import { describe, expect, test } from 'vitest';
import { toHex } from '#evidence/bytes/hex.ts';
import { ProofError } from '#evidence/errors.ts';
import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { verifyConsistency } from '#evidence/merkle/verify-consistency.ts';
import { verifyInclusion } from '#evidence/merkle/verify-inclusion.ts';
import { readConsistency, writeConsistency } from '#evidence/proof/consistency-text.ts';
import { readTlogProof, writeTlogProof } from '#evidence/proof/tlog-proof.ts';
import { growTree } from '#tests/evidence/grow-tree.ts';

const { leaves, read } = growTree(11);
const checkpoint = 'example.org/log\n11\nroot\n\n— example.org/log AAAAAAA=\n';
const inclusion = writeTlogProof({ index: 5, hashes: proveInclusion(5, 11, read), checkpoint });
const growth = writeConsistency({ old: 6, hashes: proveConsistency(6, 11, read), checkpoint });

/** Every text that differs from the given one in one bit of its part above the checkpoint. */
function* flips(text: string) {
  const bytes = Buffer.from(text);
  for (let bit = 0; bit < text.indexOf('\n\n') * 8; bit += 1) {
    const damaged = Buffer.from(bytes);
    damaged[bit >> 3]! ^= 1 << (bit & 7);
    yield damaged.toString('utf8');
  }
}

test('the forms of C2SP tlog-proof and tlog-witness', () => {
  const [first, index, ...rest] = inclusion.split('\n');
  expect([first, index]).toEqual(['c2sp.org/tlog-proof@v1', 'index 5']);
  expect(rest.slice(0, 4).every((line) => /^[A-Za-z0-9+/]{43}=$/.test(line))).toBe(true);
  expect(inclusion.endsWith(`\n\n${checkpoint}`)).toBe(true);
  expect(growth.startsWith('old 6\n')).toBe(true);
});

test('proofs read back and hold', () => {
  const { index, hashes, checkpoint: note } = readTlogProof(inclusion);
  const root = treeRoot(11, read);
  expect(note).toBe(checkpoint);
  expect(verifyInclusion({ index, size: 11, leafHash: leaves[5]!, proof: hashes, root })).toBe(
    true,
  );
  const { old, hashes: proof } = readConsistency(growth);
  const roots = { firstRoot: treeRoot(6, read), secondRoot: root };
  expect(verifyConsistency({ first: old, second: 11, proof, ...roots })).toBe(true);
});

describe('every flipped bit is refused', () => {
  test('of an inclusion proof', () => {
    const root = treeRoot(11, read);
    for (const text of flips(inclusion)) {
      let holds = false;
      try {
        const { index, hashes: proof } = readTlogProof(text);
        holds = verifyInclusion({ index, size: 11, leafHash: leaves[5]!, proof, root });
      } catch (error) {
        expect(error).toBeInstanceOf(ProofError);
      }
      expect(holds).toBe(false);
    }
  });

  test('of a consistency proof', () => {
    const roots = { firstRoot: treeRoot(6, read), secondRoot: treeRoot(11, read) };
    for (const text of flips(growth)) {
      let holds = false;
      try {
        const { old: first, hashes: proof } = readConsistency(text);
        holds = verifyConsistency({ first, second: 11, proof, ...roots });
      } catch (error) {
        expect(error).toBeInstanceOf(ProofError);
      }
      expect(holds).toBe(false);
    }
  });
});

test.each([
  ['an extra line', inclusion.replace('index', 'extra AAAA\nindex')],
  ['another version', inclusion.replace('@v1', '@v2')],
  ['a leading zero', inclusion.replace('index 5', 'index 05')],
  ['an index beyond 2^53 − 1', inclusion.replace('index 5', 'index 9007199254740993')],
  ['no checkpoint', inclusion.slice(0, inclusion.indexOf('\n\n'))],
  ['a short hash', inclusion.replace('\n\n', '\nAAAA\n\n')],
  ['64 hashes', inclusion.replace('\n\n', `\n${`${'A'.repeat(43)}=\n`.repeat(64)}\n`)],
  ['nothing', ''],
])('%s is no proof', (_, text) => {
  expect(() => readTlogProof(text)).toThrow(ProofError);
});

test('a tree of one leaf has a proof without hashes', () => {
  const one = writeTlogProof({ index: 0, hashes: proveInclusion(0, 1, read), checkpoint });
  const { hashes } = readTlogProof(one);
  expect(hashes).toEqual([]);
  expect(toHex(treeRoot(1, read))).toBe(toHex(leaves[0]!));
});
