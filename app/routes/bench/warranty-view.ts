import { dateYear, dateYearTime } from '#app/lib/format/date.ts';
import { groupedDigest } from '#app/lib/format/digest.ts';
import type { DrawnWarranty } from '#server/warranty/draw-warranty.ts';
import type { WarrantyFile } from '#server/warranty/get-warranty.ts';

/** What has been done while a warranty is being issued, in order. */
const STEPS = [
  ['drawn', 'Drawn up'],
  ['credential', 'Signed'],
  ['sealed', 'Sealed in the log'],
  ['paper', 'Put on paper'],
  ['issued', 'Handed out'],
] as const;

/** A warranty that is there, or on its way, in words. */
export function issuedView(warranty: WarrantyFile, zone: string) {
  const { step, code, term, work, standing, sealValue, paperId } = warranty;
  const reached = STEPS.findIndex(([name]) => name === step);
  return {
    code,
    isIssued: step === 'issued',
    standing,
    term: `${term}, to ${dateYear(warranty.validUntil, zone)}`,
    work: work.map(({ text, name }) => ({ text, name })),
    by: `${step === 'issued' ? 'Issued' : 'Drawn up'} by ${warranty.issuedBy}, ${dateYearTime(warranty.issuedAt ?? warranty.drawnAt, zone)}`,
    seal: sealValue && groupedDigest(sealValue),
    sealValue,
    paper: paperId && `/api/papers/${paperId}`,
    check: `/verify/${code.replaceAll('-', '')}`,
    steps: STEPS.map(([name, label], at) => ({ name, label, done: at <= reached })),
  };
}
export type IssuedView = ReturnType<typeof issuedView>;

/** A warranty that is about to be issued. */
export function drawnView({ months, term, lines, owner }: DrawnWarranty, zone: string) {
  return {
    owner,
    months,
    starts: dateYear(new Date(`${term.startsOn}T12:00:00Z`), 'UTC'),
    ends: dateYear(new Date(term.endsAt.getTime() - 1), zone),
    lines,
  };
}
export type DrawnView = ReturnType<typeof drawnView>;
