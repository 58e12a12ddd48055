import type { VerdictKind } from '#app/ui/types.ts';
import type { PaperMatch } from '#evidence/verify/compare-paper.ts';
import { sentenceOf } from '#evidence/verify/sentence.ts';
import type { Report } from '#evidence/verify/verify-bundle.ts';

/** What the visitor holds, beside the number. */
export interface HeldFacts {
  /** What the dropped PDF is to the record; null when none was dropped. */
  paper: PaperMatch | null;
  /** The record in the dropped PDF is of this warranty: same seal value, same credential. */
  sameWarranty: boolean;
  /** The seal value of a QR code was compared. */
  scanned: boolean;
  /** The QR code names a log key that this address does not publish. */
  strangeKey: boolean;
  /** Whether the shop's record agrees with itself, before anything is held against it. */
  recordHolds: boolean;
}

/** A verdict with what it means here. */
export interface Judgement {
  kind: VerdictKind;
  sentence: string;
}

function mismatch({ findings }: Report, recordHolds: boolean): Judgement {
  const failed = findings.find(({ outcome }) => outcome === 'failed');
  const why = failed ? `${sentenceOf(failed)} ` : '';
  const sentence = recordHolds
    ? 'What you hold is not what this shop sealed under this number. Do not rely on it; ask the shop.'
    : `The shop’s record does not agree with itself. ${why}Do not rely on it.`;
  return { kind: 'does-not-match', sentence };
}

function ofPaper(paper: Exclude<PaperMatch, 'this-file'>, sameWarranty: boolean): Judgement {
  switch (paper) {
    case 'added-to':
      return {
        kind: 'not-fully-checked',
        sentence:
          'What the shop issued is in this PDF unchanged, but something was added behind it. Ask the shop for the file as it was.',
      };
    case 'no-paper-named':
      return {
        kind: 'not-fully-checked',
        sentence: 'The record does not name a paper yet. Try again in a minute.',
      };
    case 'other-file':
      return sameWarranty
        ? {
            kind: 'not-fully-checked',
            sentence:
              'The record in this PDF is of this warranty, but the file is not one the shop issued. Nothing on its pages was compared.',
          }
        : {
            kind: 'does-not-match',
            sentence:
              'The PDF you hold is not one this shop issued. The shop’s own record agrees with itself.',
          };
  }
}

const UNCHECKED =
  'Known. Your paper has not been checked: compare these lines with it, or drop the PDF.';

/**
 * The verdict as the page says it. A number alone is never Intact, and a PDF decides only by its
 * bytes.
 */
export function judge(
  report: Report,
  held: HeldFacts,
  { shop, sealedOn }: { shop: string; sealedOn: string | null },
): Judgement {
  if (report.verdict === 'Does not match') return mismatch(report, held.recordHolds);
  if (held.strangeKey) {
    const sentence =
      'The QR code names a key that this shop does not publish here. Do not rely on the paper.';
    return { kind: 'does-not-match', sentence };
  }
  if (held.paper !== null && held.paper !== 'this-file') {
    return ofPaper(held.paper, held.sameWarranty);
  }
  if (held.paper === null && !held.scanned)
    return { kind: 'not-fully-checked', sentence: UNCHECKED };
  if (report.verdict !== 'Intact') {
    const open = report.findings.find(
      ({ outcome, decides }) => outcome === 'not-checked' && decides,
    );
    return {
      kind: 'not-fully-checked',
      sentence: open ? sentenceOf(open) : 'Not everything could be checked here.',
    };
  }
  const since = `since ${shop} sealed it${sealedOn === null ? '' : ` on ${sealedOn}`}.`;
  return held.paper === 'this-file'
    ? { kind: 'intact', sentence: `Nothing in this paper has changed ${since}` }
    : {
        kind: 'intact',
        sentence: `Nothing in the record that this QR code names has changed ${since} Compare the paper’s lines with it, or drop the PDF.`,
      };
}
