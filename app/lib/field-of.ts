import type { Retry } from './retry.ts';

/** What ties a control to its name, what was typed, and what is wrong with it. */
export interface FieldProps {
  name: string;
  defaultValue: string;
  error: string | undefined;
}

/** Fields of a form by their names, after an error or fresh; `preset` stands until something was typed. */
export type FieldOf = (name: string, preset?: string) => FieldProps;

/** Makes the fields of a form from what its action handed back. */
export function fieldsOf(answer: Partial<Pick<Retry, 'fields' | 'values'>> | undefined): FieldOf {
  return (name, preset = '') => ({
    name,
    defaultValue: answer?.values?.[name] ?? preset,
    error: answer?.fields?.[name],
  });
}
