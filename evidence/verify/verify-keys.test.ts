import { expect, test } from 'vitest';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { tellCase, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE, idOf, secretOf, type WitnessShop } from '#tests/evidence/witness-shop.ts';

const [first, second] = [secretOf('log'), secretOf('second log key')];
const LOG = new Uint8Array(16);

/** The log's key changes hands: the new one is added, the old one signs that head, then retires. */
function changeKey(shop: WitnessShop) {
  const added = shop.addKey('log', second);
  const handOver = shop.checkpoint();
  const size = shop.log.length;
  shop.endKey('retire', 'log', first, [shop.chainOf(LOG)[1]!]);
  shop.secret = second;
  return { added, handOver, size };
}

test('after a change of the log key an older paper still leads to the record', () => {
  const told = tellCase();
  const { shop } = told;
  const { added, handOver, size } = changeKey(shop);
  const bundle = shop.bundle(CASE);
  const at = shop.chainOf(LOG).indexOf(added);
  const verdict = (id: Uint8Array, record = bundle) =>
    verifyBundle(JSON.stringify(record), { logKeyId: idOf(id) }).verdict;
  expect(verdict(second)).toBe('Intact');
  // Nothing in this record lets the old key vouch for the new one.
  expect(verdict(first)).toBe('Not fully checked');

  bundle.entries[at] = shop.item(added, handOver, size);
  bundle.consistency = [shop.growth(size)];
  expect(verdict(first)).toBe('Intact');
  expect(verdict(second)).toBe('Intact');
  expect(verdict(first, { ...bundle, consistency: [] })).toBe('Not fully checked');
});

test('a head signed by a retired key does not match', () => {
  const { shop } = tellCase();
  changeKey(shop);
  shop.secret = first;
  const report = verifyBundle(JSON.stringify(shop.bundle(CASE)), { logKeyId: idOf(first) });
  expect(report.verdict).toBe('Does not match');
});

test('only a hand-over may be proven under an older head', () => {
  const { shop, takenIn } = tellCase();
  const bundle = shop.bundle(CASE);
  const older = shop.log.length - 1;
  bundle.entries[3] = shop.item(takenIn, shop.checkpoint(older), older);
  bundle.consistency = [shop.growth(older)];
  const report = verifyBundle(JSON.stringify(bundle), { logKeyId: idOf(first) });
  expect(report.findings).toContainEqual(
    expect.objectContaining({ id: 'inclusion', outcome: 'failed' }),
  );
});

test('a credential signed by a key revoked later needs an older time-stamp', () => {
  const told = tellCase();
  const { shop } = told;
  const add = shop.chainOf(LOG)[2]!;
  const before = shop.log.length;
  shop.endKey('revoke', 'credential', shop.credentialSecret, [add]);
  const bundle = { ...warrantyBundle(told), standing: null };
  const outside = { logKeyId: idOf(first) };
  expect(verifyBundle(JSON.stringify(bundle), outside).verdict).toBe('Does not match');

  const stamps = [{ checkpoint: shop.checkpoint(before), reply: 'AAAA' }];
  const stamped = { ...bundle, stamps, consistency: [shop.growth(before)] };
  const report = verifyBundle(JSON.stringify(stamped), outside);
  expect(report.verdict).toBe('Not fully checked');
  expect(report.findings).toContainEqual(
    expect.objectContaining({ id: 'warranty', outcome: 'not-checked' }),
  );
});

test('a key ended in other words than it was added, or added twice, does not match', () => {
  const twice = tellCase();
  twice.shop.addKey('credential', twice.shop.credentialSecret);
  const shared = tellCase();
  shared.shop.addKey('credential', first);
  const unnamed = tellCase();
  unnamed.shop.endKey('retire', 'credential', unnamed.shop.credentialSecret, []);
  for (const { shop } of [twice, shared, unnamed]) {
    const report = verifyBundle(JSON.stringify(shop.bundle(CASE)), { logKeyId: idOf(first) });
    expect(report.verdict).toBe('Does not match');
  }
});
