import fc from 'fast-check';
import { expect, test } from 'vitest';
import { sentenceOf } from '#evidence/verify/sentence.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { tellCase, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE, idOf, secretOf } from '#tests/evidence/witness-shop.ts';

const outside = { logKeyId: idOf(secretOf('log')) };
const told = tellCase();
// A warranty's record: photo salts, which nobody can check without a file, do not stand in it.
const text = JSON.stringify(warrantyBundle(told));

test('any one sign changed: never Intact, never an exception', () => {
  expect(verifyBundle(text, outside).verdict).toBe('Intact');
  fc.assert(
    fc.property(fc.nat(text.length - 1), fc.constantFrom(...'0aA+/=" ,{\\\u0301'), (at, sign) => {
      fc.pre(text[at] !== sign);
      const report = verifyBundle(text.slice(0, at) + sign + text.slice(at + 1), outside);
      expect(report.verdict).not.toBe('Intact');
      for (const line of report.findings) expect(sentenceOf(line)).toMatch(/\.$/);
    }),
    { numRuns: 120 },
  );
}, 60_000);

test('any one value replaced by another kind of value: never Intact, never an exception', () => {
  const bundle = told.shop.bundle(CASE);
  const paths: (string | number)[][] = [];
  const walk = (value: unknown, path: (string | number)[]) => {
    if (path.length > 0 && !path.includes('photos')) paths.push(path);
    if (typeof value === 'object' && value !== null) {
      for (const [key, member] of Object.entries(value)) {
        walk(member, [...path, Array.isArray(value) ? Number(key) : key]);
      }
    }
  };
  walk(bundle, []);
  fc.assert(
    fc.property(fc.constantFrom(...paths), fc.jsonValue({ maxDepth: 2 }), (path, value) => {
      const damaged = structuredClone(bundle) as unknown as Record<string | number, unknown>;
      const parent = path
        .slice(0, -1)
        .reduce<Record<string | number, unknown>>((at, key) => at[key] as never, damaged);
      const key = path.at(-1)!;
      fc.pre(JSON.stringify(parent[key]) !== JSON.stringify(value));
      // A part that is kept back is no damage.
      fc.pre(!(key === 'parts' && JSON.stringify(value) === '{}'));
      parent[key] = value;
      expect(verifyBundle(JSON.stringify(damaged), outside).verdict).not.toBe('Intact');
    }),
    { numRuns: 120 },
  );
}, 60_000);
