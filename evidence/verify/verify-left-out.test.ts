import { describe, expect, test } from 'vitest';
import { toHex } from '#evidence/bytes/hex.ts';
import { expectRefused, expectOpen, verdictOf } from '#tests/evidence/expect-verdict.ts';
import { entryShown, stand, tellCase, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE, WitnessShop } from '#tests/evidence/witness-shop.ts';

const told = tellCase();
const whole = () => structuredClone(told.shop.bundle(CASE));
const paper = () => structuredClone(warrantyBundle(told));

describe('something left out', () => {
  test('an entry in the middle, the first, or one of the log itself', () => {
    for (const [at, id] of [
      [4, 'case-chain'],
      [3, 'case-chain'],
      [1, 'own-chain'],
      [0, 'own-chain'],
    ] as const) {
      const bundle = whole();
      bundle.entries.splice(at, 1);
      expectRefused(bundle, id);
    }
  });

  test('the last entries: a signed standing under the same head denies it', () => {
    const bundle = paper();
    bundle.entries.pop();
    expectRefused(bundle, 'warranty');
    const { shop, warranty } = told;
    const cut = {
      ...shop.bundle(CASE),
      standing: stand(shop, warranty),
      credential: told.credential,
    };
    expect(verdictOf(cut)).toBe('Intact');
    const later = tellCase();
    later.shop.append('claim', CASE, {
      names: [later.warranty],
      parts: { shown: { v: 1, text: 'Lifted again.' } },
    });
    const hidden = warrantyBundle(later);
    hidden.entries.pop();
    expectRefused(hidden, 'standing');
  });

  test('the last entries, with no standing: found by their slots', () => {
    const bundle = whole();
    bundle.entries.pop();
    expect(verdictOf(bundle)).toBe('Intact');
    expectOpen(bundle, 'later-entries', { publicEntries: told.shop.publicEntries() });
  });

  test("a revocation: the log's own chain is shorter than the standing names", () => {
    const later = tellCase();
    const add = later.shop.chainOf(new Uint8Array(16))[2]!;
    later.shop.endKey('revoke', 'credential', later.shop.credentialSecret, [add]);
    const bundle = warrantyBundle(later);
    bundle.entries.splice(3, 1);
    expectRefused(bundle, 'standing');
  });

  test('what came before a record that begins at no close', () => {
    expectRefused(told.shop.bundle(CASE, 1), 'case-chain');
  });

  test('everything but the log itself', () => {
    const bundle = whole();
    bundle.entries.splice(3);
    expectRefused(bundle, 'case-chain');
  });
});

describe('two stories', () => {
  test('a slot taken twice', () => {
    const liar = tellCase();
    const first = liar.shop.log.find(({ header }) => header.case === toHex(CASE))!;
    const kept = liar.shop.bundle(CASE);
    // A second entry for seq 0 of the same case, appended without the chain noticing.
    const chainOf = liar.shop.chainOf.bind(liar.shop);
    liar.shop.chainOf = () => [];
    liar.shop.append('entry', CASE, { parts: { shown: entryShown({ text: 'Another story.' }) } });
    liar.shop.chainOf = chainOf;
    const honest = liar.shop.log
      .slice(0, -1)
      .filter(({ header }) => header.case === first.header.case);
    const [note, size] = [liar.shop.checkpoint(), liar.shop.log.length];
    const bundle = {
      ...kept,
      entries: [...liar.shop.log.filter(({ header }) => /^0+$/.test(header.case)), ...honest].map(
        (sealed) => liar.shop.item(sealed, note, size),
      ),
    };
    expect(verdictOf(bundle)).toBe('Intact');
    expectRefused(bundle, 'later-entries', { publicEntries: liar.shop.publicEntries() });
  });

  test('public entries that are not those of the head', () => {
    const entries = told.shop.publicEntries();
    entries[40]! ^= 1;
    expectRefused(paper(), 'later-entries', { publicEntries: entries });
  });

  test('two heads of one size', () => {
    const shop = new WitnessShop('another day');
    const bundle = whole();
    for (let n = shop.log.length; n < told.shop.log.length; n += 1) {
      shop.append('entry', new Uint8Array(16).fill(7), { parts: { shown: entryShown({}) } });
    }
    bundle.stamps = [{ checkpoint: shop.checkpoint(), reply: 'AAAA' }];
    expectRefused(bundle, 'checkpoint');
  });

  test('entries of two cases in one record', () => {
    const bundle = whole();
    const other = told.shop.bundle(new Uint8Array(16).fill(9));
    bundle.entries.push(other.entries.at(-1)!);
    expectRefused(bundle, 'case-chain');
  });
});
