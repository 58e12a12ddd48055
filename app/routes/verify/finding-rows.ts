import type { CheckRowView } from '#app/ui/types.ts';
import type { Finding, FindingId, Outcome } from '#evidence/verify/finding.ts';
import { sentenceOf } from '#evidence/verify/sentence.ts';

/** What each check is about, in the order the rows stand in; a finding not named here comes last. */
const HELD: [FindingId, string][] = [
  ['code', 'Warranty number'],
  ['paper-seal', 'Seal value in the QR code'],
  ['whose-key', 'Shop’s key'],
  ['warranty', 'Warranty'],
  ['case-chain', 'Timeline'],
  ['kept-back', 'Kept by the shop'],
  ['later-entries', 'Anything later'],
  ['inclusion', 'Place in the log'],
  ['checkpoint', 'Log head'],
  ['own-chain', 'The log’s own entries'],
  ['parts', 'Opened parts'],
  ['names', 'What entries name'],
  ['order', 'Order'],
  ['keys', 'Keys'],
  ['growth', 'Earlier heads'],
  ['stamps', 'Time'],
  ['bracket', 'Earliest time'],
];

const WORD: Record<Outcome, string> = {
  checked: 'Good',
  failed: 'Does not match',
  'not-checked': 'Not checked',
  'shop-word': 'The shop’s word',
};
const CHECKED: Partial<Record<FindingId, string>> = { code: 'Known', 'paper-seal': 'Matches' };

const RESULT = {
  checked: 'good',
  failed: 'bad',
  'not-checked': 'open',
  'shop-word': 'open',
} as const;

const heldOf = (id: FindingId) => HELD.find(([known]) => known === id)?.[1] ?? 'The record';
const place = (id: FindingId) => {
  const at = HELD.findIndex(([known]) => known === id);
  return at < 0 ? HELD.length : at;
};

function row(finding: Finding, more: number): CheckRowView {
  const { id, outcome } = finding;
  const others = more === 0 ? '' : ` (and ${more} more of the kind)`;
  return {
    held: heldOf(id),
    result: RESULT[outcome],
    word: (outcome === 'checked' && CHECKED[id]) || WORD[outcome],
    note: sentenceOf(finding) + others,
  };
}

/**
 * The findings of a report as rows, one for each thing that was looked at: what failed stands for the
 * others of its kind. Standing has a place of its own on the page, unless it does not match.
 */
export function findingRows(findings: Finding[]): CheckRowView[] {
  const groups = new Map<string, Finding[]>();
  for (const finding of findings) {
    if (finding.id === 'standing' && finding.outcome === 'shop-word') continue;
    const key = `${heldOf(finding.id)}/${finding.outcome}`;
    groups.set(key, [...(groups.get(key) ?? []), finding]);
  }
  return [...groups.values()]
    .map((group) => ({ first: group[0], more: group.length - 1 }))
    .flatMap(({ first, more }) => (first ? [{ at: place(first.id), row: row(first, more) }] : []))
    .sort((a, b) => a.at - b.at)
    .map((placed) => placed.row);
}
