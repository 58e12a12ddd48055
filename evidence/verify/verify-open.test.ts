import { describe, expect, test } from 'vitest';
import { toHex } from '#evidence/bytes/hex.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { expectRefused, expectOpen, entryAt } from '#tests/evidence/expect-verdict.ts';
import { tellCase, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE, idOf, secretOf } from '#tests/evidence/witness-shop.ts';

const told = tellCase();
const whole = () => structuredClone(told.shop.bundle(CASE));
const paper = () => structuredClone(warrantyBundle(told));

describe('what is not known is never Intact', () => {
  test('no key from outside; a key from outside that is not of the record', () => {
    expectOpen(whole(), 'whose-key', { logKeyId: undefined });
    expectRefused(whole(), 'whose-key', { logKeyId: idOf(secretOf('another')) });
    // The credential key is a key of this log, and still no log key.
    expectRefused(whole(), 'whose-key', { logKeyId: idOf(secretOf('credential')) });
  });

  test('members the bundle form does not name, at every depth', () => {
    expectOpen({ ...whole(), extra: 1 }, 'unknown-member');
    const bundle = whole();
    Object.assign(entryAt(bundle, 3).photos[0]!, { perceptual: '00' });
    expectOpen(bundle, 'unknown-member');
  });

  test('time-stamps, which are not read here', () => {
    const stamped = tellCase();
    const size = stamped.shop.log.length - 1;
    stamped.shop.append('claim', CASE, {
      names: [stamped.warranty],
      parts: { shown: { v: 1, text: '' } },
    });
    const bundle = {
      ...stamped.shop.bundle(CASE),
      stamps: [{ checkpoint: stamped.shop.checkpoint(size), reply: 'AAAA' }],
      consistency: [stamped.shop.growth(size)],
    };
    expectOpen(bundle, 'stamps');
    expectOpen({ ...bundle, consistency: [] }, 'growth');
    const damaged = stamped.shop.growth(size).replace(/\n./, '\nA');
    expectRefused({ ...bundle, consistency: [damaged] }, 'growth');
  });

  test('an entry whose after names a stamp that is not there', () => {
    const stamped = tellCase();
    const after = { size: 5, root: toHex(stamped.shop.root(5)), stamp: '11'.repeat(32) };
    stamped.shop.append('claim', CASE, {
      names: [stamped.warranty],
      parts: { shown: { v: 1, text: '' } },
      after,
    });
    const bundle = stamped.shop.bundle(CASE);
    expectOpen({ ...bundle, consistency: [stamped.shop.growth(5)] }, 'stamps');
    expectOpen(bundle, 'growth');
  });

  test('lost contents, where a lost entry says so; without one it does not match', () => {
    const sealed = tellCase();
    const bundle = sealed.shop.bundle(CASE);
    bundle.entries[4] = sealed.shop.lost(sealed.bench);
    expectRefused(bundle, 'lost');
    const { index: from } = sealed.bench;
    const shown = { v: 1, from, to: from, reason: 'A disk failed.' };
    sealed.shop.append('lost', new Uint8Array(16), { parts: { shown } });
    const said = sealed.shop.bundle(CASE);
    said.entries[5] = sealed.shop.lost(sealed.bench);
    expectOpen(said, 'lost');
    said.entries[5] = sealed.shop.lost(sealed.amended);
    expectRefused(said, 'inclusion');
  });

  test('a warranty record without its credential', () => {
    expectOpen({ ...paper(), credential: null, standing: null }, 'warranty');
  });

  test('a file that is no record, a newer form, a damaged file', () => {
    expect(verifyBundle('{}').verdict).toBe('Not known');
    expect(verifyBundle('a shopping list').verdict).toBe('Not known');
    const newer = JSON.stringify({ ...whole(), format: 'witnessmark-bundle/2' });
    expect(verifyBundle(newer).verdict).toBe('Not fully checked');
    const text = JSON.stringify(whole());
    expect(verifyBundle(text.slice(0, -9)).verdict).toBe('Does not match');
    expect(verifyBundle(text.replace('{', '{"origin":"x",')).verdict).toBe('Does not match');
  });
});
