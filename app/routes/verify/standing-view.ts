import { dateYearTime } from '#app/lib/format/date.ts';
import type { StandingView } from '#app/ui/types.ts';
import type { StandingWord } from '#evidence/standing/standing-shape.ts';
import type { Checked } from './check-here.ts';
import type { KnownView } from './known-view.ts';

const WORDS: Record<StandingWord, StandingView['word']> = {
  'in force': 'In force',
  ended: 'Ended',
  suspended: 'Suspended',
  withdrawn: 'Withdrawn',
  replaced: 'Replaced',
};

const DATES: Record<StandingWord, (until: string) => string> = {
  'in force': (until) => `To ${until}.`,
  ended: (until) => `On ${until}.`,
  suspended: () => 'By the shop, until it says otherwise.',
  withdrawn: () => 'By the shop. Ask it why.',
  replaced: () => 'By a newer warranty of this shop.',
};

/** A standing in words; `small` says whose word it is and how old. */
export function standingView(word: StandingWord, until: string, small: string): StandingView {
  return { word: WORDS[word], date: DATES[word](until), small };
}

const NOT_STATED =
  'What the warranty is now is not stated here: the shop’s signed word is missing or does not fit the record.';

/**
 * The standing after a check: the shop's signed word; where the record is given out without its
 * credential, what the shop says, called unchecked; and none where the record itself does not hold.
 */
export function checkedStanding(
  { standing, kind, recordHolds, subject }: Checked,
  known: KnownView,
  zone: string,
): { shown: StandingView | null; missing: string | null } {
  const { word, at } = standing;
  const ofPaper =
    kind === 'does-not-match' ? { label: 'Standing of the paper the shop issued' } : {};
  if (word !== 'not stated here' && at !== null) {
    const signed = dateYearTime(new Date(at), zone);
    const small = `Signed by the shop ${signed}; the signature was checked here. It may change; what was checked cannot.`;
    return { shown: { ...standingView(word, known.until, small), ...ofPaper }, missing: null };
  }
  if (!recordHolds || subject) return { shown: null, missing: NOT_STATED };
  const small = `${known.standing.small} That needs the record in the PDF.`;
  return { shown: { ...known.standing, ...ofPaper, small }, missing: null };
}
