import { expect, test } from 'vitest';
import { toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { concat } from '#evidence/bytes/concat.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { comparePaper } from '#evidence/verify/compare-paper.ts';
import { comparePhoto } from '#evidence/verify/compare-photo.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { tellCase } from '#tests/evidence/told-case.ts';
import { CASE, fileOf, idOf, secretOf } from '#tests/evidence/witness-shop.ts';

const outside = { logKeyId: idOf(secretOf('log')) };
const told = tellCase();

test('a picture is found by its exact bytes, as original or published copy', () => {
  const { record } = verifyBundle(JSON.stringify(told.shop.bundle(CASE)), outside);
  expect(comparePhoto(fileOf(1, 'original'), record!)).toEqual({
    compared: 8,
    matches: [{ seq: 0, n: 1, copy: 'original' }],
  });
  expect(comparePhoto(fileOf(4, 'published'), record!).matches).toEqual([
    { seq: 2, n: 4, copy: 'published' },
  ]);
  expect(comparePhoto(toUtf8('another picture'), record!).matches).toEqual([]);
});

test('a picture whose salt is kept back cannot be found', () => {
  const bundle = told.shop.bundle(CASE);
  for (const item of bundle.entries) {
    if ('photos' in item)
      item.photos = item.photos.map(({ n }) => ({ n, original: null, published: null }));
  }
  const { record, verdict } = verifyBundle(JSON.stringify(bundle), outside);
  expect(verdict).toBe('Intact');
  expect(comparePhoto(fileOf(1, 'original'), record!)).toEqual({ compared: 0, matches: [] });
});

test('a paper is this very file, something was added to it, or it is another', () => {
  const { shop, warranty } = tellCase();
  const unnamed = verifyBundle(JSON.stringify(shop.bundle(CASE)), outside).record!;
  const file = toUtf8('%PDF a paper');
  expect(comparePaper(file, unnamed)).toBe('no-paper-named');
  const shown = { v: 1, length: file.length, sha256: toHex(sha256(file)) };
  shop.append('paper', CASE, { names: [warranty], parts: { shown } });
  const record = verifyBundle(JSON.stringify(shop.bundle(CASE)), outside).record!;
  expect(comparePaper(file, record)).toBe('this-file');
  expect(comparePaper(concat(file, toUtf8(' more')), record)).toBe('added-to');
  expect(comparePaper(file.slice(1), record)).toBe('other-file');
});
