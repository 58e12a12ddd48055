import type { Checkpoint } from '#evidence/note/read-checkpoint.ts';
import { counts, type Counts, type LogKey } from '#evidence/verify/key-table.ts';
import type { Work } from '#evidence/verify/work.ts';

/** The log keys whose signatures on a checkpoint count where it stands: at its size less one. */
export function countingSigners(
  work: Work,
  checkpoint: Checkpoint,
): { key: LogKey; counts: Counts }[] {
  return checkpoint.signers.flatMap((vkey) => {
    const key = work.keys.byVkey(vkey);
    const answer = key ? counts(key, checkpoint.size - 1, stampedSizes(work)) : 'no';
    return key && answer !== 'no' ? [{ key, counts: answer }] : [];
  });
}

/** Sizes of the log that a time-stamp in the bundle is over. */
export function stampedSizes({ bundle, checkpoints }: Work): number[] {
  return bundle.stamps.flatMap(({ checkpoint }) => checkpoints.get(checkpoint)?.size ?? []);
}

/** Every checkpoint is signed by a log key that counts at its size. */
export function checkSigners(work: Work): void {
  const { findings, checkpoints, head } = work;
  for (const checkpoint of checkpoints.values()) {
    const signers = countingSigners(work, checkpoint);
    const data = { size: checkpoint.size };
    if (signers.length === 0) {
      findings.failed('checkpoint', { ...data, because: 'none of its keys counts there' });
    } else if (signers.every((signer) => signer.counts === 'stamp')) {
      findings.notChecked('checkpoint', { ...data, because: 'its key was revoked later' });
    }
  }
  if (!findings.anyFailed('checkpoint')) findings.checked('checkpoint', { size: head.size });
}
