import type { CheckRowView } from '#app/ui/types.ts';
import { groupedDigest, shortDigest } from '#app/lib/format/digest.ts';
import { dateYear, dateYearTime } from '#app/lib/format/date.ts';
import { readQrFragment } from '#evidence/code/qr-fragment.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { CodeError } from '#evidence/errors.ts';
import { comparePaper, type PaperMatch } from '#evidence/verify/compare-paper.ts';
import { verifyBundle, type Report } from '#evidence/verify/verify-bundle.ts';
import type { Outside } from '#evidence/verify/work.ts';
import type { StandingReport } from '#evidence/verify/check-standing.ts';
import { fetchRecord } from './fetch-record.ts';
import { findBundle } from './find-bundle.ts';
import { findingRows } from './finding-rows.ts';
import type { HeldPaper } from './held-paper.ts';
import { judge, type Judgement } from './judge.ts';

/** What the visitor holds: the number, what stands behind # in the address, a file. */
export interface Held {
  /** Eleven signs. */
  code: string;
  fragment: string;
  paper: HeldPaper | null;
}

/** What was found out in this browser. */
export interface Checked extends Judgement {
  rows: CheckRowView[];
  standing: StandingReport;
  /** Whether the shop's record agrees with itself, whatever is held against it. */
  recordHolds: boolean;
  /** What the checked credential says; null where it is not shown. */
  subject: { instrument: string; work: string; term: string; validUntil: string } | null;
  sealValue: string | null;
}

const PAPER: Record<PaperMatch, Pick<CheckRowView, 'result' | 'word' | 'note'>> = {
  'this-file': { result: 'good', word: 'Matches', note: 'this very file was sealed' },
  'added-to': {
    result: 'open',
    word: 'Added to',
    note: 'the file that was sealed is its beginning',
  },
  'other-file': { result: 'bad', word: 'Does not match', note: 'no such file was sealed' },
  'no-paper-named': { result: 'open', word: 'Not checked', note: 'the record names no paper yet' },
};

function paperRow(paper: HeldPaper, match: PaperMatch, sameWarranty: boolean): CheckRowView {
  const digest = shortDigest(toHex(sha256(paper.bytes)));
  const found = PAPER[match];
  const row = { held: 'PDF you dropped', heldNote: paper.name, heldCode: digest, ...found };
  return match === 'other-file' && sameWarranty
    ? { ...row, result: 'open', word: 'Other file', note: 'of the same warranty' }
    : row;
}

function compareRows({ record }: Report): CheckRowView[] {
  if (!record) return [];
  const compare = { result: 'open' as const, word: 'Compare', note: 'with your paper' };
  const subject = record.credential?.credentialSubject;
  const lines = subject ? [subject.instrument, subject.work, subject.term] : [];
  const key = record.logKeyId && groupedDigest(record.logKeyId);
  const seal = record.sealValue;
  return [
    ...lines.map((held) => ({ held, ...compare })),
    ...(key ? [{ held: '', heldNote: 'shop’s key', heldCode: key, ...compare }] : []),
    ...(seal
      ? [
          {
            held: '',
            heldNote: 'seal value',
            heldCode: [groupedDigest(seal.slice(0, 32)), groupedDigest(seal.slice(32))],
            ...compare,
          },
        ]
      : []),
  ];
}

function readQr(fragment: string) {
  try {
    return fragment === '' ? null : readQrFragment(fragment);
  } catch (error) {
    if (error instanceof CodeError) return error;
    throw error;
  }
}

function qrRows(qr: ReturnType<typeof readQr>, strangeKey: boolean): CheckRowView[] {
  if (qr instanceof CodeError) {
    return [{ held: 'QR code', result: 'open', word: 'Not read', note: qr.message }];
  }
  const note = 'this address does not publish it';
  return strangeKey
    ? [{ held: 'Key in the QR code', result: 'bad', word: 'Does not match', note }]
    : [];
}

/** The record in the paper says more than the shop lets out: its credential is held against the log. */
function withCredential(bundle: string, paperBundle: string | null): string {
  if (paperBundle === null) return bundle;
  try {
    const ours = JSON.parse(bundle) as { credential: unknown };
    if (ours.credential !== null) return bundle;
    const { credential } = JSON.parse(paperBundle) as { credential: unknown };
    return typeof credential === 'string' ? JSON.stringify({ ...ours, credential }) : bundle;
  } catch {
    return bundle;
  }
}

function isSameWarranty(paperBundle: string | null, { record }: Report): boolean {
  if (paperBundle === null || !record?.sealValue) return false;
  return verifyBundle(paperBundle).record?.sealValue === record.sealValue;
}

function sealedOn({ record }: Report, zone: string): string | null {
  const entry = record?.entries.find(({ leafHash }) => leafHash === record.sealValue);
  return entry?.header ? dateYearTime(new Date(entry.header.recordedAt), zone) : null;
}

/**
 * Fetches the record of a number and checks it here, with whatever the visitor holds. Nothing of
 * what is held is sent: the number alone is asked for.
 * @returns null when the number is not known
 * @throws Error with a sentence when the shop does not answer
 */
export async function checkHere(
  { code, fragment, paper }: Held,
  { host, shop, zone }: { host: string; shop: string; zone: string },
): Promise<Checked | null> {
  const answer = await fetchRecord(code);
  if (!answer) return null;
  const qr = readQr(fragment);
  const scanned = qr !== null && !(qr instanceof CodeError);
  const paperBundle = paper && findBundle(paper.bytes);
  const outside: Outside = {
    ...(answer.logKeyId === null
      ? {}
      : { logKeyId: answer.logKeyId, logKeyFrom: 'address', address: host }),
    ...(answer.entries ? { publicEntries: answer.entries } : {}),
  };
  // First the record alone: that a paper does not fit it says nothing against the record.
  const record = verifyBundle(answer.bundle, outside);
  const report = verifyBundle(withCredential(answer.bundle, paperBundle), {
    ...outside,
    ...(scanned ? { seal16: qr.seal16 } : {}),
    code,
  });
  const shown = report.record ? report : record;
  const match =
    paper && (shown.record ? comparePaper(paper.bytes, shown.record) : 'no-paper-named');
  const sameWarranty = isSameWarranty(paperBundle, shown);
  const strangeKey = scanned && !answer.logKeyIds.includes(qr.logKeyId);
  const recordHolds = record.verdict !== 'Does not match';
  const held = { paper: match, sameWarranty, scanned, strangeKey, recordHolds };
  const credential = shown.record?.credential ?? null;
  return {
    ...judge(report, held, { shop, sealedOn: sealedOn(shown, zone) }),
    rows: [
      ...(paper && match ? [paperRow(paper, match, sameWarranty)] : []),
      ...qrRows(qr, strangeKey),
      ...(match === 'this-file' ? [] : compareRows(shown)),
      ...findingRows(report.findings),
    ],
    standing: shown.standing,
    recordHolds,
    subject: credential && {
      ...credential.credentialSubject,
      validUntil: dateYear(new Date(credential.validUntil), zone),
    },
    sealValue: shown.record?.sealValue ?? null,
  };
}
