import { describe, test } from 'vitest';
import { expectRefused, entryAt } from '#tests/evidence/expect-verdict.ts';
import { tellCase } from '#tests/evidence/told-case.ts';
import { CASE, secretOf } from '#tests/evidence/witness-shop.ts';

const told = tellCase();
const whole = () => structuredClone(told.shop.bundle(CASE));

describe('a sealed thing changed', () => {
  test('the text of a part', () => {
    const bundle = whole();
    entryAt(bundle, 3).parts.shown!.bytes = entryAt(bundle, 3).parts.shown!.bytes.replace(
      '0.4',
      '0.6',
    );
    expectRefused(bundle, 'parts');
  });

  test('the salt of a part', () => {
    const bundle = whole();
    entryAt(bundle, 3).parts.shown!.salt = '00'.repeat(32);
    expectRefused(bundle, 'parts');
  });

  test('a part under another name, and a part nobody sealed', () => {
    const bundle = whole();
    entryAt(bundle, 3).parts.owner = entryAt(bundle, 3).parts.shown!;
    expectRefused(bundle, 'parts');
    const other = whole();
    entryAt(other, 3).parts.money = entryAt(other, 3).parts.shown!;
    expectRefused(other, 'parts');
  });

  test('a header, though it stays canonical', () => {
    const bundle = whole();
    entryAt(bundle, 3).header = entryAt(bundle, 3).header.replace(
      '"2026-04-09T08:',
      '"2026-04-09T07:',
    );
    expectRefused(bundle, 'inclusion');
  });

  test('a header or part that is not canonical', () => {
    const bundle = whole();
    entryAt(bundle, 3).header = ` ${entryAt(bundle, 3).header}`;
    expectRefused(bundle, 'header');
  });

  test('a photo left out of the list, or a salt used twice', () => {
    const bundle = whole();
    entryAt(bundle, 3).photos.pop();
    expectRefused(bundle, 'photos');
    const twice = whole();
    entryAt(twice, 3).photos[0]!.published = entryAt(twice, 3).photos[0]!.original;
    expectRefused(twice, 'salts');
  });

  test('a proof, a checkpoint, or the list of keys', () => {
    const bundle = whole();
    const entry = entryAt(bundle, 4);
    entry.proof = entry.proof.replace('index 4', 'index 5');
    expectRefused(bundle, 'inclusion');
    const signed = whole();
    signed.entries.forEach((item) => {
      item.proof = item.proof.replace(/(— \S+ \S{20})\S/, (_, kept: string) => `${kept}/`);
    });
    expectRefused(signed, 'checkpoint');
    const keys = whole();
    keys.vkeys.push(told.shop.vkeyOf(secretOf('another')));
    expectRefused(keys, 'keys');
  });
});
