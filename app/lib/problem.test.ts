import { describe, expect, it } from 'vitest';
import * as errors from '#domain/errors.ts';
import { problemResponse, refuse, statusOf, translate } from './problem.ts';

const CASES: [errors.Problem, number][] = [
  [new errors.Invalid({ serial: 'This is too long. Shorten it.' }), 400],
  [new errors.NotAllowed(), 403],
  [new errors.NotFound(), 404],
  [new errors.Conflict('This is closed. Open another.'), 409],
  [new errors.TooLarge('This is too large. Send a smaller one.'), 413],
  [new errors.Unsupported('This is no photo. Choose another.'), 415],
  [new errors.TooMany('Too often. Wait.', 40), 429],
  [new errors.Unavailable('store'), 503],
];

describe('problems', () => {
  it.each(CASES)('have a status of their own: %s', async (problem, status) => {
    expect(statusOf(problem)).toBe(status);
    const answer = problemResponse(problem);
    expect(answer.status).toBe(status);
    const { code, sentence, fields } = problem;
    expect(await answer.json()).toEqual({ code, sentence, fields });
  });

  it('go back to the form with their fields', () => {
    const { data, init } = translate(new errors.Invalid({ email: 'This is not one. Check it.' }));
    expect(init?.status).toBe(400);
    expect(data).toEqual({
      code: 'invalid',
      problem: 'This is not one. Check it.',
      fields: { email: 'This is not one. Check it.' },
    });
  });

  it('say when to come back', () => {
    const answer = problemResponse(new errors.TooMany('Too often. Wait.', 40));
    expect(answer.headers.get('Retry-After')).toBe('40');
  });

  it('are not made of faults of the program', () => {
    const fault = new TypeError('x is undefined');
    expect(() => translate(fault)).toThrow(fault);
    expect(() => problemResponse(fault)).toThrow(fault);
    expect(() => refuse(fault)).toThrow(fault);
  });
});
