import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { withNodes } from './log-nodes.ts';

/** Proofs that these leaves are in the tree with `size` leaves, by leaf index; one query for all. */
export async function inclusionProofs(
  leaves: number[],
  size: number,
): Promise<Map<number, Uint8Array[]>> {
  const proofs = await withNodes((read) =>
    leaves.map((index) => proveInclusion(index, size, read)),
  );
  return new Map(leaves.map((index, i) => [index, proofs[i] ?? []]));
}

/** Proof that the tree with `second` leaves begins with the one of `first` leaves. */
export function consistencyProof(first: number, second: number): Promise<Uint8Array[]> {
  return withNodes((read) => proveConsistency(first, second, read));
}
