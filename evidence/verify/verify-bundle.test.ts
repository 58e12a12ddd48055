import { expect, test } from 'vitest';
import { writeBundle } from '#evidence/bundle/write-bundle.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import { sentenceOf } from '#evidence/verify/sentence.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { CODE, tellCase, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE, idOf } from '#tests/evidence/witness-shop.ts';

const told = tellCase();
const logKeyId = idOf(told.shop.secret);
const address = 'https://wrenfield.example';

test('a whole case, its key known from an address, is Intact', () => {
  const text = writeBundle(told.shop.bundle(CASE));
  const report = verifyBundle(text, { logKeyId, logKeyFrom: 'address', address });
  expect(report.findings.filter(({ outcome }) => outcome === 'failed')).toEqual([]);
  expect(report.verdict).toBe('Intact');
  expect(report.standing.word).toBe('not stated here');
  expect(report.record?.entries.map(({ header }) => header?.kind)).toEqual([
    'entry',
    'entry',
    'amendment',
    'close',
    'handed-back',
    'warranty',
  ]);
});

test('a warranty, from its close on, is Intact and in force', () => {
  const { warranty, shop } = told;
  const report = verifyBundle(writeBundle(warrantyBundle(told)), {
    logKeyId,
    seal16: warranty.leafHash.slice(0, 16),
    code: CODE,
    publicEntries: shop.publicEntries(),
  });
  expect(report.findings.filter(({ outcome }) => outcome === 'failed')).toEqual([]);
  expect(report.verdict).toBe('Intact');
  expect(report.standing).toEqual({
    word: 'in force',
    at: '2026-06-01T12:00:00.000Z',
    size: shop.log.length,
  });
  expect(report.record?.sealValue).toBe(toHex(warranty.leafHash));
  expect(report.record?.credential?.credentialSubject.code).toBe(CODE);
  expect(report.findings.map(sentenceOf)).toMatchInlineSnapshot(`
    [
      "6 entries of this record: every one is in the log under that head.",
      "6 parts opened here: as sealed, every one.",
      "The log lists 2 keys, each with its use.",
      "The log’s own chain of 3 entries is whole and open.",
      "Entries 3 to 5 of the case follow one another.",
      "The log’s head of 10 entries is signed by the log’s key.",
      "Along the log, time never goes back unsaid.",
      "Entries name the entries they must name.",
      "No outside time-stamp: when something was sealed is the shop’s word.",
      "The warranty is signed by the shop’s credential key and stands in the log.",
      "The shop says, signed on 1 June 2026, 12:00 UTC: in force. The record it shows says the same.",
      "Key 57936deb4a6da25527f62a73d879d8b6, known to you from elsewhere, leads to this record.",
      "The seal value on the paper is this warranty’s.",
      "The code is this warranty’s.",
      "Nothing later is in the log up to its head of 10 entries.",
      "3 entries not bracketed from below: nothing from outside shows that it was not sealed earlier.",
      "3 entries, 0 kept by the shop: sealed, not shown; complete up to hand-back on 9 April 2026, 10:15 UTC.",
    ]
  `);
});
