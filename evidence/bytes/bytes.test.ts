import fc from 'fast-check';
import { expect, test } from 'vitest';
import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { fromBase64url, toBase64url } from '#evidence/bytes/base64url.ts';
import { concat } from '#evidence/bytes/concat.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { isInstant, toInstant } from '#evidence/bytes/instant.ts';
import { uint32 } from '#evidence/bytes/uint32.ts';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { EncodingError } from '#evidence/errors.ts';

test('hex, base64 and base64url are those of Node, and read back', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 200 }), (bytes) => {
      const buffer = Buffer.from(bytes);
      expect(toHex(bytes)).toBe(buffer.toString('hex'));
      expect(toBase64(bytes)).toBe(buffer.toString('base64'));
      expect(toBase64url(bytes)).toBe(buffer.toString('base64url'));
      for (const read of [
        fromHex(toHex(bytes)),
        fromBase64(toBase64(bytes)),
        fromBase64url(toBase64url(bytes)),
      ]) {
        expect([...read]).toEqual([...bytes]);
      }
    }),
  );
});

test('base64 of a large file does not overflow the stack', () => {
  const bytes = new Uint8Array(300_000).fill(255);
  expect(toBase64(bytes)).toBe(Buffer.from(bytes).toString('base64'));
});

test.each(['AB', 'abc', 'zz', '0x', ' 00', '00 '])('%j is not hex of ours', (text) => {
  expect(() => fromHex(text)).toThrow(EncodingError);
});

test('hex of another length than expected is refused', () => {
  expect(() => fromHex('0011', 16)).toThrow(EncodingError);
});

// RFC 4648 §3.5: decoders may refuse set pad bits. Two texts for the same bytes would let a proof
// be altered without changing what it says.
test.each(['QQ', 'QQ=', 'QR==', 'QUI=\n', ' QQ==', 'Q Q==', 'QQ==QQ==', '-_==', 'Q==='])(
  '%j is not base64 in canonical form',
  (text) => {
    expect(() => fromBase64(text)).toThrow(EncodingError);
  },
);

test.each(['QQ==', 'QR', 'Q', 'Q+', 'Q/', 'QQ\n'])('%j is not base64url', (text) => {
  expect(() => fromBase64url(text)).toThrow(EncodingError);
});

test('every text but half characters has UTF-8, and every byte comes back', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary' }), (text) => {
      expect(fromUtf8(toUtf8(text))).toBe(text);
    }),
  );
  expect(() => toUtf8('half \ud83c')).toThrow(EncodingError);
  expect(fromUtf8(Uint8Array.of(0xef, 0xbb, 0xbf, 0x41))).toBe('\ufeffA');
  expect(() => fromUtf8(Uint8Array.of(0xc0, 0x80))).toThrow(EncodingError);
});

test('uint32 is big end first and bounded', () => {
  expect([...uint32(0x01020304)]).toEqual([1, 2, 3, 4]);
  expect([...uint32(0xffffffff)]).toEqual([255, 255, 255, 255]);
  for (const wrong of [-1, 0x100000000, 1.5, NaN]) {
    expect(() => uint32(wrong)).toThrow(EncodingError);
  }
});

test('an instant has one form, a day that exists and no leap second', () => {
  expect(toInstant(new Date(Date.UTC(2026, 3, 9, 9, 12, 44, 318)))).toBe(
    '2026-04-09T09:12:44.318Z',
  );
  expect(isInstant('2028-02-29T23:59:59.999Z')).toBe(true);
  for (const wrong of [
    '2026-02-29T00:00:00.000Z',
    '2026-04-09T24:00:00.000Z',
    '2026-12-31T23:59:60.000Z',
    '2026-04-09T09:12:44Z',
    '2026-04-09T09:12:44.318+00:00',
    '2026-04-09 09:12:44.318Z',
    '+02026-04-09T09:12:44.318Z',
  ]) {
    expect(isInstant(wrong)).toBe(false);
  }
  expect(() => toInstant(new Date(NaN))).toThrow(EncodingError);
  expect(() => toInstant(new Date(8.64e15))).toThrow(EncodingError);
});

test('joining leaves nothing between', () => {
  expect([...concat(Uint8Array.of(1), new Uint8Array(0), Uint8Array.of(2, 3))]).toEqual([1, 2, 3]);
});
