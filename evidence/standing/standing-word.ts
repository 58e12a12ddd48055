import type { StandingShown } from '#evidence/chain/case-shown.ts';
import type { StandingWord } from '#evidence/standing/standing-shape.ts';

/**
 * What a warranty is, from what was done about it. The last act decides, but withdrawing and
 * replacing are final; passing it on to another owner changes nothing; and what would be in force
 * reads ended once its term is over.
 * @param acts in the order they were sealed; `replace` only where this warranty is the old one
 * @param validUntil the last instant in force
 * @param at the moment asked about
 */
export function standingWord(
  acts: readonly StandingShown['act'][],
  validUntil: string,
  at: string,
): StandingWord {
  const final = acts.find((act) => act === 'withdraw' || act === 'replace');
  if (final) return final === 'withdraw' ? 'withdrawn' : 'replaced';
  if (acts.findLast((act) => act !== 'transfer') === 'suspend') return 'suspended';
  // Instants of one form compare as text.
  return at > validUntil ? 'ended' : 'in force';
}
