import { generateKeyPairSync } from 'node:crypto';
import { describe, expect, test } from 'vitest';
import { toBase64 } from '#evidence/bytes/base64.ts';
import type { KeyShown } from '#evidence/chain/log-shown.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { writePart } from '#evidence/chain/write-part.ts';
import { KeyError, ShapeError, UnknownFormError } from '#evidence/errors.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { checkKeyLeaf } from '#evidence/key/check-key-leaf.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { ed25519Spki } from '#evidence/key/ed25519-spki.ts';
import { keyLeaf } from '#evidence/key/key-leaf.ts';
import { originOf } from '#evidence/log/origin.ts';
import { CASE_KINDS, LOG_KINDS, type Kind, type PartName } from '#evidence/seal/kinds.ts';
import { entryShown } from '#tests/evidence/told-case.ts';
import { UUID } from '#tests/evidence/witness-shop.ts';

const origin = originOf(UUID);
const hash = '11'.repeat(32);
const instant = '2026-04-09T09:12:44.318Z';
const spki = ed25519Spki(ed25519PublicKey(new Uint8Array(32).fill(7)));
const full = entryShown({
  occurred: '2026-04-09 10:12',
  used: ['Hide glue, 192 gram strength'],
  climate: { temperature: { q: '21.5', u: '°C' }, humidity: { q: '47', u: '%' } },
  rest: { product: 'Hide glue', from: instant, clampsOff: instant, worked: null, strings: null },
  photos: [
    {
      n: 3,
      caption: 'Bass side',
      taken: '2026-04-09 10:12',
      pins: [{ n: 1, x: 0, y: 10000, kind: 'damage', label: 'crack', text: '41 mm long' }],
    },
  ],
});
const text = { v: 1, text: 'x' };
const { v: _v, ...body } = full;

const shown: Record<Kind, object[]> = {
  entry: [text, full],
  amendment: [text, { ...full, copies: [{ n: 4, of: 3 }] }],
  inspection: [text, full],
  incident: [text, full],
  imported: [text, full],
  authorisation: [text],
  payment: [text],
  'rest-override': [text],
  'handed-back': [text],
  claim: [text],
  close: [{ v: 1, text: '', entries: 14, photos: 31 }],
  warranty: [{ v: 1, jws: hash }],
  paper: [{ v: 1, length: 48211, sha256: hash }],
  standing: [{ v: 1, act: 'suspend', reason: 'Under claim.' }],
  visibility: [
    { v: 1, to: 'bench', n: [1, 3] },
    { v: 1, to: 'shared', n: null },
  ],
  erased: [{ v: 1, parts: ['owner'], photos: [2], reason: 'Asked by the owner.' }],
  'log-start': [
    { v: 1, origin, vkey: 'k', replaces: null },
    { v: 1, origin, vkey: 'k', replaces: { origin, size: 9, root: hash, reason: 'Keys lost.' } },
  ],
  key: [keyLeaf({ use: 'credential', act: 'add', spki, origin, reason: null })],
  stamps: [{ v: 1, replies: [hash] }],
  clock: [{ v: 1, old: instant, new: instant, reason: 'Battery.' }],
  lost: [{ v: 1, from: 3, to: 3, reason: 'A disk failed.' }],
};
const others: [PartName, object][] = [
  ['owner', { v: 1, name: 'Marguerite Osei', text: null }],
  ['bringer', { v: 1, name: null, text: 'Brought by a neighbour.' }],
  ['payer', { v: 1, name: null, text: null }],
  ['staff', { v: 1, names: { 'technician 1': 'Tomasz Rell', 'shop owner 1': 'Ines Lund' } }],
  ['money', { v: 1, minor: -12000, cur: 'EUR' }],
  ['bench', { v: 1, text: 'Hide glue at 62 °C.', minutes: 40 }],
  ['bench', { v: 2, text: '', minutes: null, entry: body, photos: [] }],
];

/** Writes without the types' help, as data from a form or a database comes. */
const write = (kind: Kind, name: PartName, value: object) => writePart(kind, name, value as never);

describe('what a part holds', () => {
  test.each([...CASE_KINDS, ...LOG_KINDS])('shown of %s, every form', (kind) => {
    expect(shown[kind].length).toBeGreaterThan(0);
    for (const value of shown[kind]) {
      expect(readPart(kind, 'shown', write(kind, 'shown', value))).toEqual(value);
      expect(() => write(kind, 'shown', { ...value, more: 1 })).toThrow(ShapeError);
      for (const member of Object.keys(value).filter((name) => name !== 'v')) {
        const without = Object.fromEntries(
          Object.entries(value).filter(([name]) => name !== member),
        );
        expect(() => write(kind, 'shown', without)).toThrow(ShapeError);
      }
      expect(() => write(kind, 'shown', { ...value, v: 3 })).toThrow(UnknownFormError);
    }
  });

  test.each(others)('%s', (name, value) => {
    expect(readPart('payment', name, write('payment', name, value))).toEqual(value);
    expect(() => write('payment', name, { ...value, more: 1 })).toThrow(ShapeError);
  });

  test.each([
    ['a name for a person', { by: 'Tomasz Rell' }],
    ['a person without a number', { by: 'technician' }],
    ['another phase', { phase: 'later' }],
    [
      'a reading in words',
      { climate: { temperature: { q: 'warm', u: '°C' }, humidity: { q: '4', u: '%' } } },
    ],
    [
      'a number for a reading',
      { climate: { temperature: { q: 21.5, u: '°C' }, humidity: { q: '4', u: '%' } } },
    ],
    ['photos out of order', { photos: [{ ...full.photos[0], n: 4 }, full.photos[0]] }],
    [
      'a pin off the photo',
      { photos: [{ ...full.photos[0], pins: [{ ...full.photos[0]!.pins[0], x: 10001 }] }] },
    ],
    [
      'a pin twice',
      { photos: [{ ...full.photos[0], pins: [full.photos[0]!.pins[0], full.photos[0]!.pins[0]] }] },
    ],
  ])('an entry with %s is refused', (_, change) => {
    expect(() => write('entry', 'shown', { ...full, ...change })).toThrow();
  });

  test('staff is listed by role and number, money has a currency, a range ends after it begins', () => {
    expect(() => write('entry', 'staff', { v: 1, names: { Tomasz: 'x' } })).toThrow(ShapeError);
    expect(() => write('entry', 'money', { v: 1, minor: 1, cur: 'eur' })).toThrow(ShapeError);
    expect(() => write('lost', 'shown', { v: 1, from: 4, to: 3, reason: '' })).toThrow(ShapeError);
  });

  test('an unknown kind, part or form is told apart from a wrong shape', () => {
    const bytes = sealJson(text);
    expect(() => readPart('varnish' as Kind, 'shown', bytes)).toThrow(UnknownFormError);
    expect(() => readPart('entry', 'smell' as PartName, bytes)).toThrow(UnknownFormError);
    expect(() => readPart('close', 'shown', sealJson({ v: 2 }))).toThrow(UnknownFormError);
    expect(() => readPart('close', 'shown', sealJson({ v: 1 }))).toThrow(ShapeError);
    expect(() => readPart('close', 'shown', sealJson([]))).toThrow(ShapeError);
  });
});

describe('key leaves', () => {
  test('log and witness keys have a vkey, the credential key has none', () => {
    const leaf = (use: KeyShown['use']) => keyLeaf({ use, act: 'add', spki, origin, reason: null });
    expect(leaf('log').vkey).toMatch(new RegExp(`^${origin}\\+[0-9a-f]{8}\\+A`));
    expect(leaf('witness').vkey).toMatch(new RegExp(`^${origin}/witness\\+[0-9a-f]{8}\\+B`));
    expect(leaf('credential').vkey).toBeNull();
  });

  test('what does not agree with its own bytes is refused', () => {
    const leaf = keyLeaf({ use: 'log', act: 'add', spki, origin, reason: null });
    const rsa = generateKeyPairSync('rsa', { modulusLength: 3072 }).publicKey;
    const rsaSpki = rsa.export({ format: 'der', type: 'spki' });
    for (const change of [
      { id: '00'.repeat(16) },
      { use: 'witness' },
      { use: 'credential' },
      { alg: 'RSA-3072' },
      { vkey: null },
      { cert: toBase64(spki) },
      { spki: toBase64(rsaSpki) },
    ]) {
      expect(() => checkKeyLeaf({ ...leaf, ...change } as KeyShown, origin)).toThrow(KeyError);
    }
    expect(() => checkKeyLeaf(leaf, originOf(UUID.replace('3f2a', '4f2a')))).toThrow(KeyError);
    const paper = { use: 'paper', act: 'add', spki: rsaSpki, origin, reason: null } as const;
    expect(() => keyLeaf(paper)).toThrow(KeyError);
    expect(() => keyLeaf({ ...paper, cert: rsaSpki })).toThrow(KeyError);
  });
});
