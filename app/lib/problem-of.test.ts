import { UNSAFE_ErrorResponseImpl as ErrorResponse } from 'react-router';
import { describe, expect, it } from 'vitest';
import { problemOf } from './problem-of.ts';

describe('problemOf', () => {
  it('shows the sentence that was thrown', () => {
    const error = new ErrorResponse(503, '', { problem: 'The store does not answer. Wait.' });
    expect(problemOf(error)).toEqual({ status: 503, sentence: 'The store does not answer. Wait.' });
  });

  it('shows nothing of the router’s own words and of faults', () => {
    expect(problemOf(new ErrorResponse(404, 'Not Found', 'No route matches "/x"')).sentence).toBe(
      'There is nothing here under this address. Check the number.',
    );
    const { status, sentence } = problemOf(new Error('secret'));
    expect(status).toBe(500);
    expect(sentence).not.toContain('secret');
    expect(problemOf(new ErrorResponse(400, 'Bad Request', null)).status).toBe(400);
  });
});
