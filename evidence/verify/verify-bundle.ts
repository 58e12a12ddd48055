import { readBundle } from '#evidence/bundle/read-bundle.ts';
import { checkChains } from '#evidence/verify/check-chains.ts';
import { checkGrowth } from '#evidence/verify/check-growth.ts';
import { checkNames } from '#evidence/verify/check-names.ts';
import { checkOrder, countUnbracketed } from '#evidence/verify/check-order.ts';
import { checkParts } from '#evidence/verify/check-parts.ts';
import { checkPhotos, checkSalts } from '#evidence/verify/check-photos.ts';
import { checkLaterEntries } from '#evidence/verify/check-public-entries.ts';
import { checkSigners } from '#evidence/verify/check-signers.ts';
import { checkStamps } from '#evidence/verify/check-stamps.ts';
import { checkStanding, NOT_STATED, type StandingReport } from '#evidence/verify/check-standing.ts';
import { checkWarranty } from '#evidence/verify/check-warranty.ts';
import { checkPaper, checkWhoseKey } from '#evidence/verify/check-whose-key.ts';
import { Findings, type Finding } from '#evidence/verify/finding.ts';
import { readKeys } from '#evidence/verify/key-table.ts';
import { placeItems, splitChains } from '#evidence/verify/place-items.ts';
import { readCheckpoints } from '#evidence/verify/read-checkpoints.ts';
import { readRecord, type RecordShown } from '#evidence/verify/read-record.ts';
import { attempt, placeOf, type Outside, type Work } from '#evidence/verify/work.ts';

/** The verdict on a record. */
export type Verdict = 'Intact' | 'Does not match' | 'Not known' | 'Not fully checked';
/** What verifying gave: verdict and standing, of equal weight, and every line behind them. */
export type Report = {
  verdict: Verdict;
  standing: StandingReport;
  findings: Finding[];
  /** What may be shown; null when anything does not match, for then nothing of it may be relied on. */
  record: RecordShown | null;
};

/**
 * Checks a record from its bundle file and what was got apart from it. It never throws for what
 * the file holds, asks no server and looks at no clock.
 * @param text the bundle file
 * @param outside what does not come from the file; without a log key id the verdict is never Intact
 */
export function verifyBundle(text: string, outside: Outside = {}): Report {
  const findings = new Findings();
  const read = attempt(findings, 'bundle', {}, () => readBundle(text));
  if (read === null) {
    findings.notChecked('bundle', { because: 'not a record of ours' });
    return { verdict: 'Not known', standing: NOT_STATED, findings: findings.list, record: null };
  }
  if (!read) return report(findings, NOT_STATED, null);
  const { bundle, unknownMembers } = read;
  for (const member of unknownMembers) findings.notChecked('unknown-member', { member });

  const heads = readCheckpoints(bundle, findings);
  if (!heads) {
    findings.failed('checkpoint', { because: 'there is no head to go by' });
    return report(findings, NOT_STATED, null);
  }
  const items = placeItems(bundle, heads.checkpoints, findings);
  const { own, chain } = splitChains(items, findings);
  checkParts(items, findings);
  const keys = readKeys(own, bundle, findings);
  const work: Work = { bundle, outside, findings, ...heads, own, chain, keys };

  checkChains(work);
  checkSigners(work);
  checkOrder(work);
  checkNames(work);
  checkPhotos(work);
  checkSalts(work);
  checkStamps(work);
  checkGrowth(work);
  const warranty = checkWarranty(work);
  const standing = checkStanding(work, warranty);
  checkWhoseKey(work);
  checkPaper(work, warranty);
  checkLaterEntries(work, standing);
  countUnbracketed(work);
  countKeptBack(work);
  return report(findings, standing, readRecord(work, warranty));
}

function report(findings: Findings, standing: StandingReport, record: RecordShown | null): Report {
  const open = findings.list.some((line) => line.outcome === 'not-checked' && line.decides);
  const verdict = findings.anyFailed() ? 'Does not match' : open ? 'Not fully checked' : 'Intact';
  const failed = verdict === 'Does not match';
  return {
    verdict,
    standing: failed ? NOT_STATED : standing,
    findings: findings.list,
    record: failed ? null : record,
  };
}

/** How much of the case the shop keeps to itself, and how far it is complete. */
function countKeptBack({ chain, findings }: Work): void {
  const kept = chain.filter(({ entry }) => entry && Object.keys(entry.parts).length === 0);
  const back = chain.findLast(({ header }) => header?.kind === 'handed-back');
  const last = back ?? chain.at(-1);
  if (!last) return;
  findings.line('kept-back', 'checked', {
    ...placeOf(last),
    count: chain.length,
    kept: kept.length,
    kind: last.header?.kind ?? null,
    at: last.header?.recordedAt ?? null,
  });
}
