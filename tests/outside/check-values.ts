import { readCases } from '#tests/outside/bench-cases.ts';

/** One published or independently computed value, typed for the test that reads it. */
export type CheckValue<Inputs, Expected> = {
  id: string;
  inputs: Inputs;
  expected: Expected;
  source: string;
};

/** The values of one file in check-values, of one computation; there is at least one. */
export function checkValues<Inputs, Expected>(file: string, computation: string) {
  const values = readCases(file).filter((value) => value.computation === computation);
  if (values.length === 0) throw new Error(`${file} has no value for ${computation}.`);
  return values as unknown as CheckValue<Inputs, Expected>[];
}
