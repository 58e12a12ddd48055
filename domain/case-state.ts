import { type RestFacts, restHoldsUntil, restTimes, type RestTime } from './rest-times.ts';

/** What a case waits for. Derived from facts, never set by hand. */
export const CASE_STATES = ['bench', 'rest', 'owner', 'home', 'handed back'] as const;
export type CaseState = (typeof CASE_STATES)[number];

/** The facts a case's state follows from. */
export interface CaseFacts {
  closedAt: Date | null;
  handedBackAt: Date | null;
  /** Why the case may not go on, in words; null when it may. */
  onHold: string | null;
  rests: readonly RestFacts[];
  /** The newest revision of the estimate, when it was sent and has no answer yet. */
  openEstimate: { sentAt: Date } | null;
  /** When something was last added to the timeline. */
  lastAddedAt: Date | null;
  now: Date;
}

export interface CaseStateNow {
  state: CaseState;
  /** While resting: the next of the times, and the rest it belongs to. */
  next: (RestTime & { rest: RestFacts }) | null;
  /** On the bench: the time that has come since anything was last added. */
  over: RestTime | null;
}

/** What each state is called on screens. */
export const CASE_STATE_WORDS: Record<CaseState, string> = {
  bench: 'On the bench',
  rest: 'Resting',
  owner: 'Waiting for the owner',
  home: 'Ready to go home',
  'handed back': 'Handed back',
};

const byTime = (a: RestTime, b: RestTime) => a.at.getTime() - b.at.getTime();

function nextTime(rests: readonly RestFacts[], now: Date): CaseStateNow['next'] {
  const ahead = rests
    .filter((rest) => (restHoldsUntil(rest)?.at ?? now) > now)
    .flatMap((rest) => restTimes(rest).map((time) => ({ ...time, rest })))
    .filter(({ at }) => at > now)
    .sort(byTime);
  return ahead[0] ?? null;
}

function timeOver({ rests, lastAddedAt, now }: CaseFacts): RestTime | null {
  const come = rests
    .flatMap((rest) => restHoldsUntil(rest) ?? [])
    .filter(({ at }) => at <= now && (lastAddedAt === null || at > lastAddedAt))
    .sort(byTime);
  return come.at(-1) ?? null;
}

/**
 * What a case waits for at `facts.now`. The first that holds wins: handed back, closed (ready to go
 * home), waiting for the owner (an estimate without an answer, or on hold), resting, on the bench.
 */
export function caseState(facts: CaseFacts): CaseStateNow {
  const only = (state: CaseState): CaseStateNow => ({ state, next: null, over: null });
  if (facts.handedBackAt) return only('handed back');
  if (facts.closedAt) return only('home');
  if (facts.openEstimate || facts.onHold !== null) return only('owner');
  const next = nextTime(facts.rests, facts.now);
  if (next) return { state: 'rest', next, over: null };
  return { state: 'bench', next: null, over: timeOver(facts) };
}
