import fc from 'fast-check';
import { expect, test } from 'vitest';
import { ALPHABET, checkSign, isCode } from '#evidence/code/crockford.ts';
import { codeOfBits, drawCode } from '#evidence/code/draw-code.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { parseCode } from '#evidence/code/parse-code.ts';
import { qrFragment, readQrFragment } from '#evidence/code/qr-fragment.ts';
import { CodeError, EncodingError } from '#evidence/errors.ts';

const random = fc.uint8Array({ minLength: 7, maxLength: 7 });
const code = random.map((bytes) => codeOfBits(bytes)).filter((drawn) => drawn !== null);

test('Crockford’s check sign is the number modulo 37', () => {
  // Worked by hand: 32 is "10", 32 mod 37 is 32, the first of the five signs for checks alone.
  expect(checkSign('0000000010')).toBe('*');
  expect(checkSign('0000000011')).toBe('~');
  expect(checkSign('0000000014')).toBe('U');
  expect(checkSign('0000000015')).toBe('0');
  expect(checkSign('ZZZZZZZZZZ')).toBe(ALPHABET[Number((2n ** 50n - 1n) % 37n)]);
});

test('50 bits make ten signs, the first bits first; the last six of seven bytes do not count', () => {
  expect(codeOfBits(new Uint8Array(7))).toBe('00000000000');
  expect(codeOfBits(Uint8Array.of(0b00001000, 0, 0, 0, 0, 0, 63))?.slice(0, 2)).toBe('10');
  expect(() => codeOfBits(new Uint8Array(8))).toThrow(EncodingError);
});

test('one whose check sign nobody could type is drawn again', () => {
  const [unlucky, lucky] = [Uint8Array.of(0, 0, 0, 0, 0, 8, 0), new Uint8Array(7)];
  expect(codeOfBits(unlucky)).toBeNull();
  const draws = [unlucky, lucky];
  expect(drawCode(() => draws.shift()!)).toBe('00000000000');
  expect(draws).toEqual([]);
});

test('as printed, in any case, with O for 0 and I or L for 1, it is the same code', () => {
  fc.assert(
    fc.property(code, fc.constantFrom('-', ' ', '\u2013', ' - ', ''), (one, gap) => {
      const printed = formatCode(one);
      expect(printed).toMatch(/^.{4}-.{4}-.{3}$/);
      expect(parseCode(printed)).toBe(one);
      expect(parseCode(printed.toLowerCase().replaceAll('-', gap))).toBe(one);
      expect(parseCode(printed.replaceAll('0', 'o').replaceAll('1', 'l'))).toBe(one);
      expect(parseCode(printed.replaceAll('0', 'O').replaceAll('1', 'I'))).toBe(one);
    }),
  );
});

test('every single wrong sign and every two neighbours swapped are noticed', () => {
  fc.assert(
    fc.property(code, fc.nat(10), fc.constantFrom(...ALPHABET), (one, at, sign) => {
      fc.pre(one[at] !== sign);
      expect(isCode(one.slice(0, at) + sign + one.slice(at + 1))).toBe(false);
      fc.pre(at < 10 && one[at] !== one[at + 1]);
      expect(isCode(one.slice(0, at) + one[at + 1] + one[at] + one.slice(at + 2))).toBe(false);
    }),
  );
});

test.each(['', '0000', '0000-0000-0001', '0000-0000-00U', '000000000000', 'zzzz-zzzz-zz*'])(
  '%j gets a sentence',
  (typed) => {
    expect(() => parseCode(typed)).toThrow(CodeError);
    expect(() => parseCode(typed)).toThrow(/Compare it with your paper/);
  },
);

test('a QR fragment reads back and nothing else passes for one', () => {
  const seal = Uint8Array.from({ length: 32 }, (_, at) => at);
  const id = '57936deb4a6da25527f62a73d879d8b6';
  const fragment = qrFragment(seal, id);
  expect(fragment).toMatch(/^#1\.[A-Za-z0-9_-]{22}\.[A-Za-z0-9_-]{22}$/);
  const expected = { seal16: seal.slice(0, 16), logKeyId: id };
  expect(readQrFragment(fragment)).toEqual(expected);
  expect(readQrFragment(fragment.slice(1))).toEqual(expected);
  const body = fragment.slice(3);
  for (const wrong of [
    '',
    '#',
    `#2.${body}`,
    `#1.${body}.`,
    `#1.${body}A`,
    '#1.AA.AA',
    `#1.${body.slice(1)}`,
  ]) {
    expect(() => readQrFragment(wrong)).toThrow(CodeError);
  }
  expect(() => qrFragment(seal.slice(1), id)).toThrow(EncodingError);
  expect(() => qrFragment(seal, id.slice(2))).toThrow(EncodingError);
});
