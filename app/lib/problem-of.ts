import { isRouteErrorResponse } from 'react-router';
import type { ProblemView } from './problem.ts';

const NOTHING_HERE = 'There is nothing here under this address. Check the number.';
const BROKEN =
  'Something in the shop’s program broke. Nothing you entered was changed. Try again, and tell the shop if it happens twice.';

/** The status and the sentence that an error page shows for what was thrown. */
export function problemOf(error: unknown): { status: number; sentence: string } {
  if (!isRouteErrorResponse(error)) return { status: 500, sentence: BROKEN };
  const { status } = error;
  const said = (error.data as Partial<ProblemView> | null)?.problem;
  if (typeof said === 'string') return { status, sentence: said };
  return { status, sentence: status === 404 ? NOTHING_HERE : BROKEN };
}
