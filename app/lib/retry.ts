import { data } from 'react-router';
import { translate, type ProblemView } from './problem.ts';
import { textsOf } from './read-form.ts';

/** What an action hands back to show its form again: what is wrong, and what was typed. */
export interface Retry extends ProblemView {
  values: Record<string, string>;
}

/** As `translate`, with what was typed, so that nothing is lost where no script has run yet. */
export function retry(error: unknown, form: FormData) {
  const { data: problem, init } = translate(error);
  return data<Retry>({ ...problem, values: textsOf(form) }, init ?? undefined);
}
