import { expect } from 'vitest';
import type { Bundle, BundleEntry } from '#evidence/bundle/bundle-shape.ts';
import { writeBundle } from '#evidence/bundle/write-bundle.ts';
import type { Finding, FindingId } from '#evidence/verify/finding.ts';
import { sentenceOf } from '#evidence/verify/sentence.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import type { Outside } from '#evidence/verify/work.ts';
import { idOf, secretOf } from '#tests/evidence/witness-shop.ts';

/** The id of the log key every simulated shop starts with. */
export const LOG_KEY = idOf(secretOf('log'));

/** Every line has a sentence of its own, and none of them the general one. */
function expectSentences(lines: Finding[]) {
  for (const line of lines) {
    expect(sentenceOf(line)).not.toMatch(
      /^Something|^Checked here|^This is the shop|undefined|NaN/,
    );
    expect(sentenceOf(line)).toMatch(/[^.]\.$/);
  }
}

/** Fails unless the record does not match, and for this reason among others; nothing is shown. */
export function expectRefused(bundle: Bundle | object, id: FindingId, outside: Outside = {}) {
  const report = verifyBundle(JSON.stringify(bundle), { logKeyId: LOG_KEY, ...outside });
  expect(report.verdict).toBe('Does not match');
  const failed = report.findings.filter((line) => line.outcome === 'failed');
  expect(failed.map((line) => line.id)).toContain(id);
  expect(report.record).toBeNull();
  expectSentences(report.findings);
}

/** Fails unless nothing of the record is wrong and it is not fully checked for this reason. */
export function expectOpen(bundle: Bundle | object, id: FindingId, outside: Outside = {}) {
  const report = verifyBundle(JSON.stringify(bundle), { logKeyId: LOG_KEY, ...outside });
  expect(report.findings.filter((line) => line.outcome === 'failed')).toEqual([]);
  expect(report.findings).toContainEqual(
    expect.objectContaining({ id, outcome: 'not-checked', decides: true }),
  );
  expect(report.verdict).toBe('Not fully checked');
  expectSentences(report.findings);
}

/** The verdict on a record, its log key known. */
export function verdictOf(bundle: Bundle, outside: Outside = {}) {
  return verifyBundle(writeBundle(bundle), { logKeyId: LOG_KEY, ...outside }).verdict;
}

/** An item of a bundle that is there and not lost. */
export function entryAt(bundle: Bundle, at: number): BundleEntry {
  return bundle.entries[at] as BundleEntry;
}
