import { expect, test } from 'vitest';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';
import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { rootOfLeaves } from '#evidence/merkle/root-of-leaves.ts';
import { verifyConsistency } from '#evidence/merkle/verify-consistency.ts';
import { verifyInclusion } from '#evidence/merkle/verify-inclusion.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { checkValues } from '#tests/outside/check-values.ts';

const values = <I, E>(name: string) => checkValues<I, E>('merkle', `crypto.merkle_${name}`);
const base64 = (text: string) => Uint8Array.from(Buffer.from(text, 'base64'));

const roots = values<{ leaves_hex: string[] }, { root_hex: string }>('root');
const leaves = roots.at(-1)!.inputs.leaves_hex.map((leaf) => leafHash(fromHex(leaf)));

/** The published tree, stored the way a server stores it. */
const nodes = new Map<string, Uint8Array>();
const read = (level: number, index: number) => nodes.get(`${level}/${index}`)!;
for (const [index, leaf] of leaves.entries()) {
  for (const node of nodesOfAppend(index, leaf, read)) {
    nodes.set(`${node.level}/${node.index}`, node.hash);
  }
}

test.each(roots)('$id ($source)', ({ inputs, expected }) => {
  const hashes = inputs.leaves_hex.map((leaf) => leafHash(fromHex(leaf)));
  expect(toHex(rootOfLeaves(hashes))).toBe(expected.root_hex);
});

test.each(values<{ leaf_hex: string }, { leaf_hash_hex: string }>('leaf'))(
  '$id ($source)',
  ({ inputs, expected }) => {
    expect(toHex(leafHash(fromHex(inputs.leaf_hex)))).toBe(expected.leaf_hash_hex);
  },
);

test.each(
  values<
    { leaf_index: number; tree_size: number; leaf_hash_hex: string; root_hex: string },
    { proof_hex: string[] }
  >('inclusion'),
)('$id ($source)', ({ inputs, expected }) => {
  const { leaf_index: index, tree_size: size, leaf_hash_hex, root_hex } = inputs;
  const proof = proveInclusion(index, size, read);
  expect(proof.map(toHex)).toEqual(expected.proof_hex);
  const claim = { index, size, leafHash: fromHex(leaf_hash_hex), proof, root: fromHex(root_hex) };
  expect(verifyInclusion(claim)).toBe(true);
});

test.each(
  values<
    {
      leaf_index: number;
      tree_size: number;
      leaf_hash_b64: string;
      root_b64: string;
      proof_b64: string[];
    },
    { valid: boolean }
  >('inclusion_negative'),
)('$id ($source)', ({ inputs, expected }) => {
  const claim = {
    index: inputs.leaf_index,
    size: inputs.tree_size,
    leafHash: base64(inputs.leaf_hash_b64),
    root: base64(inputs.root_b64),
    proof: inputs.proof_b64.map(base64),
  };
  expect(verifyInclusion(claim)).toBe(expected.valid);
});

test.each(
  values<
    { first: number; second: number; first_root_hex: string; second_root_hex: string },
    { proof_hex: string[] }
  >('consistency'),
)('$id ($source)', ({ inputs, expected }) => {
  const { first, second, first_root_hex, second_root_hex } = inputs;
  const proof = proveConsistency(first, second, read);
  expect(proof.map(toHex)).toEqual(expected.proof_hex);
  const hashes = { firstRoot: fromHex(first_root_hex), secondRoot: fromHex(second_root_hex) };
  expect(verifyConsistency({ first, second, ...hashes, proof })).toBe(true);
});

test.each(
  values<
    {
      first: number;
      second: number;
      first_root_b64: string;
      second_root_b64: string;
      proof_b64: string[];
    },
    { valid: boolean }
  >('consistency_negative'),
)('$id ($source)', ({ inputs, expected }) => {
  const claim = {
    first: inputs.first,
    second: inputs.second,
    firstRoot: base64(inputs.first_root_b64),
    secondRoot: base64(inputs.second_root_b64),
    proof: inputs.proof_b64.map(base64),
  };
  expect(verifyConsistency(claim)).toBe(expected.valid);
});
