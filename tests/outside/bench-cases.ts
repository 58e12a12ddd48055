import { readFileSync } from 'node:fs';
import { expect } from 'vitest';

/** One checked value with where it comes from; `obtained` is explained in the file's `marks`. */
export interface BenchCase {
  id: string;
  computation: string;
  inputs: Record<string, unknown>;
  expected: Record<string, unknown>;
  tolerance: Record<string, number>;
  source: string;
  obtained: string;
}

/** What one computation is given and what it must come to, as its cases have it. */
export type Inputs = Record<string, number>;

/** The cases of one file in check-values, all with a source. */
export function readCases(file: string): BenchCase[] {
  const url = new URL(`./check-values/${file}.json`, import.meta.url);
  const { cases } = JSON.parse(readFileSync(url, 'utf8')) as { cases: BenchCase[] };
  for (const one of cases) {
    if (!one.source || !one.obtained) throw new Error(`${one.id} names no source`);
  }
  return cases;
}

/** The cases of one computation; there must be as many as the file is known to hold. */
export function casesOf(cases: BenchCase[], computation: string, count: number): BenchCase[] {
  const found = cases.filter((one) => one.computation === computation);
  if (found.length !== count) {
    throw new Error(`${computation}: ${found.length} cases found, ${count} known`);
  }
  return found;
}

/** The least difference a value printed with nine digits can have. */
const printed = (value: number) =>
  value === 0 ? 1e-12 : 10 ** (Math.floor(Math.log10(Math.abs(value))) - 8);

/** Fails unless `actual` is `expected` within the tolerance and the printing of the expected value. */
export function expectNear(
  actual: number,
  expected: number,
  { abs = 0, rel = 0 }: { abs?: number; rel?: number },
): void {
  if (!(abs > 0 || rel > 0)) throw new Error('no tolerance is given');
  const allowed = Math.max(abs, rel * Math.abs(expected), printed(expected));
  expect(Math.abs(actual - expected), `${actual} against ${expected}`).toBeLessThanOrEqual(allowed);
}

/**
 * Compares what was worked out with every expected value of a case; a value expected and not worked
 * out, or the reverse, fails.
 */
export function expectCase(
  one: BenchCase,
  actual: Record<string, number | number[]>,
  tolerance: { abs?: number; rel?: number },
): void {
  expect(Object.keys(actual).sort()).toEqual(Object.keys(one.expected).sort());
  for (const [key, value] of Object.entries(actual)) {
    const wanted = one.expected[key];
    if (Array.isArray(value)) {
      expect(wanted).toHaveLength(value.length);
      value.forEach((part, index) =>
        expectNear(part, (wanted as number[])[index] ?? NaN, tolerance),
      );
    } else {
      expectNear(value, wanted as number, tolerance);
    }
  }
}
