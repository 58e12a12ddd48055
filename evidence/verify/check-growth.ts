import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { verifyConsistency } from '#evidence/merkle/verify-consistency.ts';
import { readConsistency } from '#evidence/proof/consistency-text.ts';
import { attempt, itemsOf, type Work } from '#evidence/verify/work.ts';

/**
 * Every older head the record names grew into the head in hand: those that were time-stamped,
 * those an entry's `after` names, and those under which one log key handed over to the next.
 */
export function checkGrowth(work: Work): void {
  const { findings, bundle, head } = work;
  const older = olderRoots(work);
  const proven = new Set<number>();
  let last = 0;
  for (const text of bundle.consistency) {
    const proof = attempt(findings, 'growth', {}, () => readConsistency(text));
    const newer = proof && work.checkpoints.get(proof.checkpoint);
    if (!proof || !newer) continue;
    const data = { size: proof.old };
    const root = older.get(proof.old);
    if (newer.size !== head.size) {
      findings.failed('growth', { ...data, because: 'not up to the head' });
    } else if (proof.old <= last) {
      findings.failed('growth', { ...data, because: 'out of order' });
    } else if (!root) {
      findings.notChecked('growth', { ...data, because: 'no older head of this size is known' });
    } else if (grew(proof.old, root, proof.hashes, work)) {
      proven.add(proof.old);
    } else {
      findings.failed('growth', { ...data, because: 'the log did not grow into the head' });
    }
    last = proof.old;
  }
  for (const size of older.keys()) {
    if (!proven.has(size) && !findings.anyFailed('growth')) {
      findings.notChecked('growth', { size, because: 'no proof of it is there' });
    }
  }
  if (proven.size > 0 && !findings.anyFailed('growth')) {
    findings.checked('growth', { count: proven.size });
  }
}

function grew(old: number, root: Uint8Array, proof: Uint8Array[], { head }: Work): boolean {
  const { size: second, root: secondRoot } = head;
  return verifyConsistency({ first: old, second, firstRoot: root, secondRoot, proof });
}

/** Roots of the older heads that need a proof, by size. */
function olderRoots(work: Work): Map<number, Uint8Array> {
  const { bundle, checkpoints, findings, head } = work;
  const roots = new Map<number, Uint8Array>();
  const heads = [
    ...bundle.stamps.map((stamp) => stamp.checkpoint),
    ...itemsOf(work).map((i) => i.under),
  ]
    .map((note) => checkpoints.get(note))
    .filter((checkpoint) => checkpoint !== undefined);
  for (const { size, root } of heads) if (size < head.size) roots.set(size, root);
  for (const { header } of itemsOf(work)) {
    const after = header?.after;
    if (!after) continue;
    const known = after.size === head.size ? head.root : roots.get(after.size);
    if (known && toHex(known) !== after.root) {
      findings.failed('growth', { size: after.size, because: 'two roots for one size' });
    }
    if (after.size < head.size && !known) roots.set(after.size, fromHex(after.root));
  }
  return roots;
}
