import fc from 'fast-check';
import { expect, test } from 'vitest';
import { LimitError, ProofError } from '#evidence/errors.ts';
import { readEntryBundle, writeEntryBundle } from '#evidence/tiles/entry-bundle.ts';
import { entriesPath, tilePath, tileWidth } from '#evidence/tiles/tile-path.ts';

test('paths are those of C2SP tlog-tiles', () => {
  // The index is the example the specification gives.
  expect(tilePath(0, 1234067)).toBe('tile/0/x001/x234/067');
  expect(tilePath(1, 0)).toBe('tile/1/000');
  expect(entriesPath(273, 112)).toBe('tile/entries/273.p/112');
  for (const wrong of [() => tilePath(64, 0), () => tilePath(0, -1), () => entriesPath(0, 0)]) {
    expect(wrong).toThrow(LimitError);
  }
});

test('a tree of 70,000 leaves has the tiles the specification counts', () => {
  // C2SP tlog-tiles, "Partial Tiles".
  expect(tileWidth(0, 272, 70_000)).toBe(256);
  expect(tileWidth(0, 273, 70_000)).toBe(112);
  expect(tileWidth(0, 274, 70_000)).toBe(0);
  expect(tileWidth(1, 0, 70_000)).toBe(256);
  expect(tileWidth(1, 1, 70_000)).toBe(17);
  expect(tileWidth(2, 0, 70_000)).toBe(1);
  expect([tileWidth(0, 0, 256), tileWidth(1, 0, 256)]).toEqual([256, 1]);
});

test('entry bundles read back, joined too, and end where an entry ends', () => {
  const entry = fc.uint8Array({ maxLength: 300 });
  fc.assert(
    fc.property(fc.array(entry), fc.array(entry), (one, two) => {
      const joined = Buffer.concat([writeEntryBundle(one), writeEntryBundle(two)]);
      expect(readEntryBundle(joined).map((e) => [...e])).toEqual(
        [...one, ...two].map((e) => [...e]),
      );
    }),
  );
  const bundle = writeEntryBundle([new Uint8Array(65)]);
  expect([...bundle.slice(0, 2)]).toEqual([0, 65]);
  expect(() => readEntryBundle(bundle.slice(0, -1))).toThrow(ProofError);
  expect(() => readEntryBundle(Uint8Array.of(0))).toThrow(ProofError);
  expect(() => writeEntryBundle([new Uint8Array(65536)])).toThrow(ProofError);
});
