import type { CaseState } from './case-state.ts';
import type { Phase } from './entry-draft.ts';

/** What the suggestion follows from. */
export interface PhaseFacts {
  state: CaseState;
  /** Phases that have an entry already. */
  used: readonly Phase[];
  /** Whether an estimate was authorised. */
  authorised: boolean;
}

/**
 * The phase an entry most likely belongs to, to start the choice from: `before` until the work was
 * authorised or begun, `after` once something of that phase is there or the case is closed.
 */
export function phaseSuggested({ state, used, authorised }: PhaseFacts): Phase {
  if (used.includes('after') || state === 'home' || state === 'handed back') return 'after';
  return used.includes('during') || state === 'rest' || authorised ? 'during' : 'before';
}
