import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { EvidenceError, LimitError, SealedJsonError } from '#evidence/errors.ts';
import { readJson } from '#evidence/json/read-json.ts';
import { readSealedJson } from '#evidence/json/read-sealed-json.ts';
import { sealJson } from '#evidence/json/seal-json.ts';

const text = fc.string({ unit: 'grapheme' }).map((value) => value.normalize('NFC'));
const value = fc.letrec((tie) => ({
  value: fc.oneof(
    { depthSize: 'small' },
    fc.maxSafeInteger(),
    text,
    fc.boolean(),
    fc.constant(null),
    fc.array(tie('value')),
    fc.dictionary(text, tie('value')),
  ),
})).value;

describe('sealing', () => {
  test('what is sealed reads back the same, and seals to the same bytes again', () => {
    fc.assert(
      fc.property(value, (one) => {
        const bytes = sealJson(one);
        const read = readSealedJson(bytes);
        expect(read).toEqual(JSON.parse(JSON.stringify(one)));
        expect(fromUtf8(sealJson(read))).toBe(fromUtf8(bytes));
      }),
    );
  });

  test('text is brought to NFC on the way in, names too', () => {
    expect(fromUtf8(sealJson({ 'e\u0301': 'A\u030a' }))).toBe('{"é":"Å"}');
    expect(() => sealJson({ 'e\u0301': 1, é: 2 })).toThrow(SealedJsonError);
  });

  test.each([
    ['undefined', { a: undefined }],
    ['a fraction', { a: 0.5 }],
    ['a number beyond 2^53 − 1', [2 ** 53]],
    ['infinity', Infinity],
    ['a date', new Date(0)],
    ['bytes', new Uint8Array(2)],
    ['a bigint', 1n],
    ['a function', () => 1],
    ['a hole', new Array(2)],
    ['half a character', 'x\ud800'],
    ['an instance', new (class Thing {})()],
  ])('%s cannot be sealed', (_, wrong) => {
    expect(() => sealJson(wrong)).toThrow(EvidenceError);
  });

  test('a member named __proto__ is a member like any other', () => {
    const bytes = sealJson(JSON.parse('{"__proto__":{"v":1}}'));
    expect(fromUtf8(bytes)).toBe('{"__proto__":{"v":1}}');
    expect(Object.keys(readSealedJson(bytes) as object)).toEqual(['__proto__']);
  });

  test('length and depth have a limit, to the byte and level', () => {
    expect(sealJson('x'.repeat(10), 12)).toHaveLength(12);
    expect(() => sealJson('x'.repeat(11), 12)).toThrow(LimitError);
    const nested = (levels: number) => {
      return JSON.parse('['.repeat(levels) + ']'.repeat(levels)) as unknown;
    };
    expect(readSealedJson(sealJson(nested(32)))).toEqual(nested(32));
    expect(() => sealJson(nested(33))).toThrow(LimitError);
    expect(() => readSealedJson(toUtf8('['.repeat(33) + ']'.repeat(33)))).toThrow(LimitError);
    expect(() => readSealedJson(toUtf8('"xx"'), 3)).toThrow(LimitError);
  });
});

describe('reading sealed JSON', () => {
  test.each([
    ['spaces', '{"a": 1}'],
    ['a newline at the end', '{"a":1}\n'],
    ['another order', '{"b":1,"a":2}'],
    ['a member twice', '{"a":1,"a":1}'],
    ['a member twice, escaped', '{"a":1,"\\u0061":1}'],
    ['an escape nobody needs', '{"a":"\\u0062"}'],
    ['a capital escape', '"\\u001F"'],
    ['a fraction', '{"a":0.5}'],
    ['minus zero', '-0'],
    ['an exponent', '1e2'],
    ['a number beyond 2^53 − 1', '9007199254740992'],
    ['a byte order mark', '\ufeff{}'],
    ['half a character', '"\\ud800"'],
    ['nothing', ''],
    ['half a value', '{"a":'],
    ['two values', '{}{}'],
    ['a comment', '{}//'],
  ])('%s is refused', (_, wrong) => {
    expect(() => readSealedJson(toUtf8(wrong))).toThrow(EvidenceError);
  });

  test('text that is not NFC is read as it is: a verifier never normalises', () => {
    expect(readSealedJson(toUtf8('"e\u0301"'))).toBe('e\u0301');
  });

  test('every flipped bit gives other content or is refused', () => {
    const bytes = sealJson({ v: 1, text: 'Bridge lifted at the bass side, 0.4 mm.', n: [1, 20] });
    const before = JSON.stringify(readSealedJson(bytes));
    for (let bit = 0; bit < bytes.length * 8; bit += 1) {
      const damaged = bytes.map((byte, at) => (at === bit >> 3 ? byte ^ (1 << (bit & 7)) : byte));
      let after: string | null = null;
      try {
        after = JSON.stringify(readSealedJson(damaged));
      } catch (error) {
        expect(error).toBeInstanceOf(EvidenceError);
      }
      expect(after).not.toBe(before);
    }
  });
});

describe('reading plain JSON', () => {
  test('it need not be canonical', () => {
    expect(readJson(' { "b" : [ 0.5 ] , "a" : { } } ', 99)).toEqual({ b: [0.5], a: {} });
    expect(readJson('{"a":{"b":1},"c":[{"b":1},{"b":2}],"b":":{"}', 99)).toBeTypeOf('object');
  });

  test('a member twice, too deep, too long or no JSON is refused', () => {
    expect(() => readJson('{"a":1,\n"\\u0061" :2}', 99)).toThrow(SealedJsonError);
    expect(() => readJson('[{"x":{"a":1,"a":1}}]', 99)).toThrow(SealedJsonError);
    expect(() => readJson('['.repeat(40), 99)).toThrow(LimitError);
    expect(() => readJson('[1]', 2)).toThrow(LimitError);
    expect(() => readJson('{"a\\":1}', 99)).toThrow(SealedJsonError);
    expect(() => readJson(']]"', 99)).toThrow(SealedJsonError);
  });
});
