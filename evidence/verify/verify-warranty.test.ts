import { describe, expect, test } from 'vitest';
import { toHex } from '#evidence/bytes/hex.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import {
  LOG_KEY,
  expectRefused,
  expectOpen,
  verdictOf,
  entryAt,
} from '#tests/evidence/expect-verdict.ts';
import { entryShown, stand, tellCase, warrant, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE } from '#tests/evidence/witness-shop.ts';

const told = tellCase();
const paper = () => structuredClone(warrantyBundle(told));

describe('the warranty', () => {
  test('a credential that is another than the log holds', () => {
    const bundle = paper();
    bundle.credential = warrant(tellCase().shop, told.closed, { name: 'x' }).credential;
    expectRefused(bundle, 'warranty');
  });

  test('a record that begins at another close than the one its warranty names', () => {
    const sealed = tellCase();
    const { shop } = sealed;
    const shown = { v: 1, text: '', entries: 6, photos: 4 };
    const later = shop.append('close', CASE, { names: shop.chainOf(CASE), parts: { shown } });
    const again = { ...sealed, closed: later, ...warrant(shop, later, { name: 'again' }) };
    expectOpen(warrantyBundle(again), 'unknown-member');
    expectRefused(warrantyBundle({ ...again, closed: sealed.closed }), 'warranty');
  });

  test('a member nobody knows keeps it from being fully checked, a refused one does not match', () => {
    const unknown = tellCase();
    const sealed = { ...unknown, ...warrant(unknown.shop, unknown.closed, { evidence: [] }) };
    expectOpen(warrantyBundle(sealed), 'unknown-member');
    const refused = tellCase();
    const dated = { ...refused, ...warrant(refused.shop, refused.closed, { exp: 1 }) };
    expectRefused(warrantyBundle(dated), 'warranty');
  });

  test.each([
    ['withdrawn', ['withdraw']],
    ['withdrawn', ['withdraw', 'resume']],
    ['suspended', ['suspend']],
    ['in force', ['suspend', 'resume', 'transfer']],
  ] as const)('%s after %s', (word, acts) => {
    const sealed = tellCase();
    for (const act of acts) {
      const shown = { v: 1, act, reason: null };
      sealed.shop.append('standing', CASE, { names: [sealed.warranty], parts: { shown } });
    }
    const bundle = warrantyBundle(sealed);
    const honest = { ...bundle, standing: stand(sealed.shop, sealed.warranty, { standing: word }) };
    const report = verifyBundle(JSON.stringify(honest), { logKeyId: LOG_KEY });
    expect([report.verdict, report.standing.word]).toEqual(['Intact', word]);
    const other = word === 'in force' ? 'suspended' : 'in force';
    expectRefused(
      { ...bundle, standing: stand(sealed.shop, sealed.warranty, { standing: other }) },
      'standing',
    );
  });

  test('past its term it reads ended, whatever the shop would like', () => {
    const [ended, late] = ['ended' as const, '2028-05-02T00:00:00.000Z'];
    const { shop, warranty } = told;
    const bundle = { ...paper(), standing: stand(shop, warranty, { standing: ended, at: late }) };
    expect(verifyBundle(JSON.stringify(bundle)).standing.word).toBe('ended');
    expectRefused({ ...bundle, standing: stand(shop, warranty, { at: late }) }, 'standing');
  });

  test('an act that is kept back leaves the standing open', () => {
    const sealed = tellCase();
    const parts = { shown: { v: 1, act: 'withdraw', reason: null } };
    sealed.shop.append('standing', CASE, { names: [sealed.warranty], parts });
    const bundle = warrantyBundle(sealed);
    entryAt(bundle, bundle.entries.length - 1).parts = {};
    expectOpen(bundle, 'standing');
  });

  test('a standing older than the head says nothing, about another warranty it does not match', () => {
    const sealed = tellCase();
    const older = stand(sealed.shop, sealed.warranty);
    sealed.shop.append('entry', new Uint8Array(16).fill(9), { parts: { shown: entryShown({}) } });
    const bundle = { ...warrantyBundle(sealed), standing: older };
    expect(verifyBundle(JSON.stringify(bundle)).standing.word).toBe('not stated here');
    expect(verdictOf(bundle)).toBe('Intact');
    const seal = '11'.repeat(32);
    expectRefused(
      { ...bundle, standing: stand(sealed.shop, sealed.warranty, { seal }) },
      'standing',
    );
  });

  test('a standing that denies a later entry', () => {
    const sealed = tellCase();
    const { seq, C } = { seq: 4, C: toHex(sealed.handedBack.commitment) };
    const standing = stand(sealed.shop, sealed.warranty, { seq, C });
    expectRefused({ ...warrantyBundle(sealed), standing }, 'standing');
  });

  test('the paper: another seal value, another code', () => {
    expectRefused(paper(), 'paper-seal', { seal16: new Uint8Array(16) });
    expectRefused(paper(), 'code', { code: '11111111116' });
  });
});
