import { describe, expect, it } from 'vitest';
import { caseState, CASE_STATE_WORDS, CASE_STATES, type CaseFacts } from './case-state.ts';
import type { RestFacts } from './rest-times.ts';

const at = (hours: number) => new Date(Date.UTC(2026, 3, 15, 12) + hours * 3_600_000);
const now = at(0);
const plain: CaseFacts = {
  closedAt: null,
  handedBackAt: null,
  onHold: null,
  rests: [],
  openEstimate: null,
  lastAddedAt: null,
  now,
};
const rest = (
  clampsOff: number | null,
  worked: number | null,
  strings: number | null,
): RestFacts => ({
  startedAt: at(-100),
  clampsOffAt: clampsOff === null ? null : at(clampsOff),
  workedAt: worked === null ? null : at(worked),
  stringsAt: strings === null ? null : at(strings),
});

describe('the state of a case', () => {
  it('is the first that holds, in every combination of the facts', () => {
    const choices = [false, true];
    let seen = 0;
    for (const handedBack of choices)
      for (const closed of choices)
        for (const held of choices)
          for (const estimate of choices)
            for (const resting of choices) {
              const facts: CaseFacts = {
                ...plain,
                handedBackAt: handedBack ? at(-1) : null,
                closedAt: closed ? at(-2) : null,
                onHold: held ? 'Asks for proof of ownership.' : null,
                openEstimate: estimate ? { sentAt: at(-3) } : null,
                rests: resting ? [rest(1, 2, 3)] : [],
              };
              const expected = handedBack
                ? 'handed back'
                : closed
                  ? 'home'
                  : held || estimate
                    ? 'owner'
                    : resting
                      ? 'rest'
                      : 'bench';
              expect(caseState(facts).state).toBe(expected);
              seen += 1;
            }
    expect(seen).toBe(32);
  });

  it('has words for every state', () => {
    expect(Object.keys(CASE_STATE_WORDS).sort()).toEqual([...CASE_STATES].sort());
  });

  // Each of the three times passed, ahead or not used: 27 rests.
  const hours = [-1, 1, null];
  const rests = hours.flatMap((a) => hours.flatMap((b) => hours.map((c) => [a, b, c] as const)));
  it.each(rests)('with clamps off %s h, worked %s h, strings %s h', (a, b, c) => {
    const { state, next } = caseState({ ...plain, rests: [rest(a, b, c)] });
    const holds = a === null && b === null ? c === 1 : a === 1 || b === 1;
    expect(state).toBe(holds ? 'rest' : 'bench');
    const name = a === 1 ? 'clamps off' : b === 1 ? 'may be worked' : 'may carry strings';
    expect(next?.name ?? null).toBe(holds ? name : null);
  });

  it('names the soonest time of several rests', () => {
    const { next } = caseState({
      ...plain,
      rests: [rest(9, 20, 40), rest(-3, 2, 30), rest(-9, -8, 1)],
    });
    expect(next).toMatchObject({ name: 'may be worked', at: at(2) });
  });

  it('rests until the very instant, then is on the bench', () => {
    const rests = [rest(0, null, null)];
    expect(caseState({ ...plain, rests, now: at(-0.0001) }).state).toBe('rest');
    expect(caseState({ ...plain, rests })).toEqual({
      state: 'bench',
      next: null,
      over: { name: 'clamps off', at: at(0) },
    });
  });

  it('says a time has come only until something is added', () => {
    const rests = [rest(-5, -5, 20)];
    expect(caseState({ ...plain, rests, lastAddedAt: at(-90) }).over?.name).toBe('clamps off');
    expect(caseState({ ...plain, rests, lastAddedAt: at(-4) }).over).toBeNull();
    expect(caseState({ ...plain, rests: [rest(-5, -1, 20)], lastAddedAt: at(-90) }).over).toEqual({
      name: 'may be worked',
      at: at(-1),
    });
  });
});
