import { expect, test } from 'vitest';
import { tellCase } from '#tests/evidence/told-case.ts';
import { expectOpen, expectRefused, verdictOf } from '#tests/evidence/expect-verdict.ts';
import { CASE, type WitnessShop } from '#tests/evidence/witness-shop.ts';

const shown = { v: 1, text: 'x' };

/** A told case with one more entry that a newer program made, and its record. */
function newer(append: (shop: WitnessShop) => unknown) {
  const { shop } = tellCase();
  append(shop);
  return { shop, bundle: shop.bundle(CASE) };
}

test('an entry like any other, made the same way, is Intact', () => {
  const { bundle } = newer((shop) => shop.appendNewer('entry', {}, { shown }));
  expect(verdictOf(bundle)).toBe('Intact');
});

test('an unknown kind ends only its own rules', () => {
  const { bundle } = newer((shop) => shop.appendNewer('varnish', {}, { shown: { v: 7 } }));
  expectOpen(bundle, 'unknown-kind');
  const broken = newer((shop) => shop.appendNewer('varnish', { prev: '00'.repeat(32) }, { shown }));
  expectRefused(broken.bundle, 'case-chain');
});

test('an unknown part, opened or kept back', () => {
  const { bundle } = newer((shop) => shop.appendNewer('entry', {}, { shown, smell: { v: 1 } }));
  expectOpen(bundle, 'unknown-part');
  const item = bundle.entries.at(-1)!;
  if ('parts' in item) item.parts.smell!.bytes = '{"v":2}';
  expectRefused(bundle, 'parts');
});

test('an unknown form of a part', () => {
  expectOpen(newer((shop) => shop.appendNewer('entry', {}, { shown: { v: 9 } })).bundle, 'parts');
});

test('an unknown form of a header ends the reading of that header only', () => {
  const { shop, bundle } = newer((one) => one.appendNewer('entry', { v: 2, more: 1 }, { shown }));
  expectOpen(bundle, 'header');
  // What follows it still must follow it.
  shop.appendNewer('entry', {}, { shown });
  expectOpen(shop.bundle(CASE), 'header');
  shop.appendNewer('entry', { prev: '00'.repeat(32) }, { shown });
  expectRefused(shop.bundle(CASE), 'case-chain');
});

test('a log entry with another first byte', () => {
  const { shop, bundle } = newer((one) => one.appendNewer('entry', {}, { shown }, 3));
  const sealed = shop.log.at(-1)!;
  bundle.entries[bundle.entries.length - 1] = shop.lost(sealed);
  expectRefused(bundle, 'lost');
  const lost = { v: 1, from: sealed.index, to: sealed.index, reason: 'A disk failed.' };
  shop.append('lost', new Uint8Array(16), { parts: { shown: lost } });
  const said = shop.bundle(CASE);
  said.entries[said.entries.length - 1] = shop.lost(sealed);
  expectOpen(said, 'lost');
  expectOpen(said, 'later-entries', { publicEntries: shop.publicEntries() });
});
