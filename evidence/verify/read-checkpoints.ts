import { toHex } from '#evidence/bytes/hex.ts';
import type { Bundle } from '#evidence/bundle/bundle-shape.ts';
import { EvidenceError, KeyError, ShapeError } from '#evidence/errors.ts';
import { isOrigin } from '#evidence/log/origin.ts';
import { readCheckpoint, type Checkpoint } from '#evidence/note/read-checkpoint.ts';
import { decodeVkey, LOG_TYPE } from '#evidence/note/vkey.ts';
import { readConsistency } from '#evidence/proof/consistency-text.ts';
import { readTlogProof } from '#evidence/proof/tlog-proof.ts';
import type { Findings } from '#evidence/verify/finding.ts';
import { attempt } from '#evidence/verify/work.ts';

/**
 * Reads every checkpoint a bundle holds, signatures included, and finds the head: the largest.
 * Whether each signer's key counts at that size is checked once the key leaves are read.
 * @returns null when there is none to go by
 */
export function readCheckpoints(
  bundle: Bundle,
  findings: Findings,
): { checkpoints: Map<string, Checkpoint>; head: Checkpoint } | null {
  if (!attempt(findings, 'keys', {}, () => checkLog(bundle))) return null;
  const checkpoints = new Map<string, Checkpoint>();
  const roots = new Map<number, string>();
  for (const note of new Set(notesOf(bundle))) {
    const checkpoint = attempt(findings, 'checkpoint', {}, () => readCheckpoint(note, bundle));
    if (!checkpoint) continue;
    checkpoints.set(note, checkpoint);
    const root = toHex(checkpoint.root);
    if ((roots.get(checkpoint.size) ?? root) !== root) {
      findings.failed('checkpoint', { size: checkpoint.size, because: 'two roots for one size' });
    }
    roots.set(checkpoint.size, root);
  }
  const head = [...checkpoints.values()].reduce<Checkpoint | null>(
    (largest, one) => (largest && largest.size >= one.size ? largest : one),
    null,
  );
  return head && { checkpoints, head };
}

function checkLog({ origin, vkeys }: Bundle): boolean {
  if (!isOrigin(origin)) throw new ShapeError('This is not the origin of a witness log.');
  for (const { name, type } of vkeys.map(decodeVkey)) {
    if (name !== origin || type !== LOG_TYPE) throw new KeyError('A key is not this log’s.');
  }
  if (vkeys.length === 0) throw new KeyError('The record names no key of its log.');
  return true;
}

/** The notes of all proofs; a text that is no proof is reported where it is needed. */
function notesOf(bundle: Bundle): string[] {
  const notes = bundle.stamps.map(({ checkpoint }) => checkpoint);
  const proofs = bundle.entries.map(
    ({ proof }) =>
      () =>
        readTlogProof(proof),
  );
  const growth = bundle.consistency.map((text) => () => readConsistency(text));
  for (const read of [...proofs, ...growth]) {
    try {
      notes.push(read().checkpoint);
    } catch (error) {
      if (!(error instanceof EvidenceError)) throw error;
    }
  }
  return notes;
}
