import { dateYear, dateYearTime } from '#app/lib/format/date.ts';
import { groupedDigest } from '#app/lib/format/digest.ts';
import type { CheckRowView, StandingView } from '#app/ui/types.ts';
import type { KnownNumber } from '#server/warranty/known-number.ts';
import { standingView } from './standing-view.ts';

/** What the shop says of a number it has issued; nothing of it was checked. */
export interface KnownView {
  until: string;
  standing: StandingView;
  sealValue: string;
  subject: { instrument: string; work: string; term: string } | null;
  rows: CheckRowView[];
}

const COMPARE = { result: 'open', word: 'Compare', note: 'with your paper' } as const;

/** The lines to hold against the paper, as the server says them. */
export function knownView(number: string, known: KnownNumber, zone: string): KnownView {
  const { subject, sealValue, logKeyId, issuedAt, validUntil, headAt } = known;
  const until = dateYear(validUntil, zone);
  const lines = subject ? [subject.instrument, subject.work, subject.term] : [`To ${until}`];
  return {
    until,
    standing: standingView(
      known.standing,
      until,
      `Said by the shop under its log head of ${dateYearTime(headAt, zone)}. Not checked in your browser.`,
    ),
    sealValue,
    subject,
    rows: [
      {
        held: number,
        result: 'open',
        word: 'Known',
        note: `issued ${dateYear(issuedAt, zone)}, the shop says`,
      },
      ...lines.map((held) => ({ held, ...COMPARE })),
      { held: '', heldNote: 'shop’s key', heldCode: groupedDigest(logKeyId), ...COMPARE },
      {
        held: '',
        heldNote: 'seal value',
        heldCode: [groupedDigest(sealValue.slice(0, 32)), groupedDigest(sealValue.slice(32))],
        ...COMPARE,
      },
    ],
  };
}
