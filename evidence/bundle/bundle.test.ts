import { expect, test } from 'vitest';
import { readBundle } from '#evidence/bundle/read-bundle.ts';
import { writeBundle } from '#evidence/bundle/write-bundle.ts';
import { LimitError, SealedJsonError, ShapeError, UnknownFormError } from '#evidence/errors.ts';

const entry = { header: '{}', salt: '00', parts: {}, photos: [], proof: 'p' };
const bundle = {
  format: 'witnessmark-bundle/1' as const,
  origin: 'witnessmark/3f2a9c647d1b4e089a550c6be1d2f713',
  vkeys: ['k'],
  entries: [
    { ...entry, parts: { shown: { bytes: '{}', salt: '00' } } },
    { ...entry, photos: [{ n: 1, original: null, published: '00' }] },
    { entry: '02', proof: 'p' },
  ],
  credential: null,
  stamps: [{ checkpoint: 'c', reply: 'AAAA' }],
  consistency: ['old 1'],
  standing: null,
};

test('a bundle reads back', () => {
  expect(readBundle(writeBundle(bundle))).toEqual({ bundle, unknownMembers: [] });
});

test('what is not ours is told apart from what is damaged or newer', () => {
  expect(readBundle('')).toBeNull();
  expect(readBundle('{"format":"another/1"}')).toBeNull();
  expect(readBundle('"witnessmark-bundle/1"')).toBeNull();
  expect(() => readBundle(JSON.stringify({ ...bundle, format: 'witnessmark-bundle/2' }))).toThrow(
    UnknownFormError,
  );
  expect(() => readBundle(JSON.stringify(bundle).slice(1))).toThrow(SealedJsonError);
  expect(() => readBundle(JSON.stringify(bundle).replace('{', '{"origin":"",'))).toThrow(
    SealedJsonError,
  );
});

test.each([
  ['no entries', { entries: undefined }],
  ['entries of another kind', { entries: ['x'] }],
  ['an entry both lost and there', { entries: [{ ...entry, entry: '02' }] }],
  ['an entry without its proof', { entries: [{ ...entry, proof: undefined }] }],
  ['a part without its salt', { entries: [{ ...entry, parts: { shown: { bytes: '{}' } } }] }],
  ['a credential left out', { credential: undefined }],
  ['one stamp, not a list', { stamps: bundle.stamps[0] }],
])('%s is refused', (_, change) => {
  expect(() => readBundle(JSON.stringify({ ...bundle, ...change }))).toThrow(ShapeError);
});

test('members the form does not name are reported, wherever they stand', () => {
  const more = (value: object) => ({ ...value, more: 1 });
  const full = more({
    ...bundle,
    entries: [
      more({ ...entry, parts: { shown: more({ bytes: '', salt: '' }) } }),
      more({ ...entry, photos: [more({ n: 1, original: null, published: null })] }),
      more({ entry: '02', proof: 'p' }),
    ],
    stamps: bundle.stamps.map(more),
  });
  expect(readBundle(JSON.stringify(full))?.unknownMembers.sort()).toEqual([
    'entries.more',
    'entries.parts.more',
    'entries.photos.more',
    'more',
    'stamps.more',
  ]);
});

test('length and depth have a limit', () => {
  const deep = `${'['.repeat(40)}"witnessmark-bundle/1"${']'.repeat(40)}`;
  expect(() => readBundle(deep)).toThrow(LimitError);
  expect(() => readBundle('x'.repeat(64 * 1024 * 1024 + 1))).toThrow(LimitError);
});
