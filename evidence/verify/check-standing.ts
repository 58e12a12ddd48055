import { toHex } from '#evidence/bytes/hex.ts';
import type { StandingShown } from '#evidence/chain/case-shown.ts';
import { ShapeError, SignatureError } from '#evidence/errors.ts';
import { readCheckpoint } from '#evidence/note/read-checkpoint.ts';
import { readStanding } from '#evidence/standing/read-standing.ts';
import type { Standing, StandingWord } from '#evidence/standing/standing-shape.ts';
import { standingWord } from '#evidence/standing/standing-word.ts';
import { countingSigners, stampedSizes } from '#evidence/verify/check-signers.ts';
import type { Warranty } from '#evidence/verify/check-warranty.ts';
import { counts } from '#evidence/verify/key-table.ts';
import { attempt, placeOf, shownOf, type Work } from '#evidence/verify/work.ts';

/** What the shop says a warranty is now; `not stated here` when it says nothing under the head. */
export type StandingReport = {
  word: StandingWord | 'not stated here';
  at: string | null;
  size: number | null;
};
export const NOT_STATED: StandingReport = { word: 'not stated here', at: null, size: null };

/**
 * The signed standing against the record: made under the head in hand, about this warranty, naming
 * the last entries shown, and its word the one the standing leaves say.
 */
export function checkStanding(work: Work, warranty: Warranty | null): StandingReport {
  const { bundle, findings } = work;
  if (!warranty) {
    if (bundle.standing !== null) findings.notChecked('standing', { because: 'no warranty' });
    return NOT_STATED;
  }
  if (bundle.standing === null) {
    findings.line('standing', 'shop-word', { because: 'none is given' });
    return NOT_STATED;
  }
  const jws = bundle.standing;
  const report = attempt(findings, 'standing', {}, () => check(work, warranty, jws));
  return report ?? NOT_STATED;
}

function check(work: Work, warranty: Warranty, jws: string): StandingReport {
  const { findings, keys, head, bundle } = work;
  const { standing, kid } = readStanding(jws, keys.credentialKey);
  const checkpoint = readCheckpoint(standing.checkpoint, bundle);
  const index = checkpoint.size - 1;
  const answer = counts(keys.find('credential', kid)!, index, stampedSizes(work));
  if (answer === 'no' || countingSigners(work, checkpoint).length === 0) {
    throw new SignatureError('A key of it does not count at the size it names.');
  }
  if (answer === 'stamp') findings.notChecked('standing', { because: 'its key was revoked later' });
  if (standing.seal !== toHex(warranty.leaf.leafHash)) {
    throw new ShapeError('It speaks of another warranty.');
  }
  if (checkpoint.size > head.size) {
    throw new ShapeError('It names a head beyond the one everything else is under.');
  }
  if (checkpoint.size < head.size) {
    findings.line('standing', 'shop-word', { because: 'older than the head', at: standing.at });
    return NOT_STATED;
  }
  if (toHex(checkpoint.root) !== toHex(head.root)) throw new ShapeError('It names another head.');
  checkLastEntries(work, standing);
  return { ...checkWord(work, warranty, standing), size: checkpoint.size };
}

function checkLastEntries({ own, chain }: Work, standing: Standing): void {
  const [last, ownLast] = [chain.at(-1), own.at(-1)];
  const same =
    last?.case === standing.case &&
    last.seq === standing.seq &&
    (last.commitment ?? standing.C) === standing.C &&
    ownLast?.seq === standing.ownSeq &&
    (ownLast.commitment ?? standing.ownC) === standing.ownC;
  if (!same) throw new ShapeError('It names other last entries than the record shows.');
}

function checkWord(
  work: Work,
  { leaf, credential }: Warranty,
  { standing: word, at }: Standing,
): Omit<StandingReport, 'size'> {
  const acts: StandingShown['act'][] = [];
  let known = true;
  for (const item of work.chain) {
    const { header, seq } = item;
    const other = header && (header.kind !== 'standing' || header.names[0] !== leaf.commitment);
    if (seq <= leaf.seq || other) continue;
    const shown = shownOf<StandingShown>(item, 'standing');
    if (shown) acts.push(shown.act);
    else {
      known = false;
      work.findings.notChecked('standing', { ...placeOf(item), because: 'not open' });
    }
  }
  if (known && standingWord(acts, credential.validUntil, at) !== word) {
    throw new ShapeError('Its word is not what the record says.');
  }
  if (known) work.findings.line('standing', 'shop-word', { word, at });
  return known ? { word, at } : NOT_STATED;
}
