import { describe, expect, test } from 'vitest';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { EncodingError, EvidenceError, ShapeError, UnknownFormError } from '#evidence/errors.ts';
import { canonicalText } from '#evidence/json/canonical-text.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { headerBytes } from '#evidence/seal/header-bytes.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import { LOG_CASE, type Header } from '#evidence/seal/header.ts';
import { logEntry, readLogEntry } from '#evidence/seal/log-entry.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import { photoCommitment } from '#evidence/seal/photo-commitment.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';
import { writeEntry } from '#evidence/seal/write-entry.ts';

const hash = '11'.repeat(32);
const photo = { n: 1, original: hash, published: '22'.repeat(32), visibility: 'shared' as const };
const header: Header = {
  v: 1,
  kind: 'entry',
  case: '00112233445566778899aabbccddeeff',
  seq: 1,
  prev: hash,
  recordedAt: '2026-04-09T09:12:44.318Z',
  occurredAt: '2026-04-09T08:00:00.000Z',
  parts: { shown: hash },
  photos: [photo],
  names: [],
  after: { size: 7, root: hash, stamp: hash },
  visibility: 'shared',
};
const bench = {
  ...header,
  visibility: 'bench' as const,
  parts: { bench: hash },
  occurredAt: null,
  photos: [{ ...photo, visibility: 'bench' as const }],
};
const own = {
  ...header,
  case: LOG_CASE,
  kind: 'clock',
  photos: [],
  occurredAt: null,
};

describe('headers', () => {
  test('a case entry, a bench-only one and one of the log itself read back', () => {
    for (const one of [header, bench, own]) expect(readHeader(headerBytes(one))).toEqual(one);
  });

  test.each([
    ['no entry before it', { prev: null }],
    ['one before the first', { seq: 0 }],
    ['a seq beyond the limit of a case', { seq: 1000 }],
    ['a kind of the log itself', { kind: 'key' }],
    ['photos out of order', { photos: [{ ...photo, n: 2 }, photo] }],
    ['a photo twice', { photos: [photo, photo] }],
    ['photo 0', { photos: [{ ...photo, n: 0 }] }],
    ['101 photos', { photos: Array.from({ length: 101 }, (_, n) => ({ ...photo, n: n + 1 })) }],
    ['a name twice', { names: [hash, hash] }],
    ['a short hash', { parts: { shown: '11' } }],
    ['a capital hash', { prev: 'AA'.repeat(32) }],
    ['an instant of another form', { recordedAt: '2026-04-09T09:12:44Z' }],
    ['an after without a leaf', { after: { size: 0, root: hash, stamp: hash } }],
    ['a member nobody named', { note: 'x' }],
    ['a member missing', { occurredAt: undefined }],
    ['a fraction', { seq: 1.5 }],
  ])('%s is refused, writing and reading', (_, change) => {
    const wrong = { ...header, ...change };
    expect(() => headerBytes(wrong as Header)).toThrow(EvidenceError);
    const bytes = toUtf8(canonicalText(JSON.parse(JSON.stringify(wrong)) as JsonValue));
    expect(() => readHeader(bytes)).toThrow(EvidenceError);
  });

  test.each([
    ['a bench entry that shows something', { ...bench, parts: { shown: hash } }],
    ['a bench entry that tells a time', { ...bench, occurredAt: header.occurredAt }],
    ['a bench entry that shares a photo', { ...bench, photos: [photo] }],
    ['an entry of the log kept back', { ...own, visibility: 'bench' }],
    ['an entry of the log with a photo', { ...own, photos: [photo] }],
    ['an entry of the log with another part', { ...own, parts: { shown: hash, staff: hash } }],
    ['an entry of the log that tells a time', { ...own, occurredAt: header.occurredAt }],
    ['a case kind in the log itself', { ...own, kind: 'entry' }],
    ['a log that starts twice', { ...own, kind: 'log-start' }],
    ['a log that does not start', { ...own, seq: 0, prev: null }],
  ])('%s is refused', (_, wrong) => {
    expect(() => readHeader(sealJson(wrong))).toThrow(ShapeError);
  });

  test('an unknown kind or part can be read and not be written, an unknown v neither', () => {
    const kind = { ...header, kind: 'varnish' };
    expect(readHeader(sealJson(kind)).kind).toBe('varnish');
    expect(() => headerBytes(kind)).toThrow(ShapeError);
    const part = { ...header, parts: { shown: hash, smell: hash } };
    expect(readHeader(sealJson(part)).parts.smell).toBe(hash);
    expect(() => headerBytes(part)).toThrow(ShapeError);
    expect(() => readHeader(sealJson({ v: 2, all: 'else' }))).toThrow(UnknownFormError);
    expect(() => readHeader(sealJson({ all: 'else' }))).toThrow(ShapeError);
    expect(() => readHeader(sealJson([1]))).toThrow(ShapeError);
  });

  test('every flipped bit is refused or gives another commitment', () => {
    const bytes = headerBytes(header);
    const salt = new Uint8Array(32).fill(4);
    const before = toHex(headerCommitment(salt, bytes));
    for (let bit = 0; bit < bytes.length * 8; bit += 1) {
      const damaged = bytes.map((byte, at) => (at === bit >> 3 ? byte ^ (1 << (bit & 7)) : byte));
      expect(toHex(headerCommitment(salt, damaged))).not.toBe(before);
      let read: Header | null = null;
      try {
        read = readHeader(damaged);
      } catch (error) {
        expect(error).toBeInstanceOf(EvidenceError);
      }
      expect(read).not.toEqual(header);
    }
  });
});

describe('commitments', () => {
  const salt = new Uint8Array(32);

  test('name, copy, salt and content all count, and cannot run into one another', () => {
    const part = (name: string, bytes: string) => toHex(partCommitment(name, salt, toUtf8(bytes)));
    const commitments = [
      part('shown', 'x'),
      part('show', 'nx'),
      part('shown', 'y'),
      part('staff', 'x'),
    ];
    expect(new Set(commitments).size).toBe(4);
    const copies = (['original', 'published'] as const).map((copy) =>
      toHex(photoCommitment(copy, salt, salt)),
    );
    expect(copies[0]).not.toBe(copies[1]);
  });

  test('lengths are fixed', () => {
    expect(() => partCommitment('shown', new Uint8Array(31), salt)).toThrow(EncodingError);
    expect(() => photoCommitment('original', salt, new Uint8Array(20))).toThrow(EncodingError);
    expect(() => headerCommitment(new Uint8Array(33), salt)).toThrow(EncodingError);
    expect(() => slotTag(salt, 0)).toThrow(EncodingError);
    expect(() => slotTag(new Uint8Array(16), 2 ** 32)).toThrow(EncodingError);
    expect(() => logEntry(salt, new Uint8Array(16))).toThrow(EncodingError);
  });

  test('a log entry of another length or first byte is not known', () => {
    const entry = logEntry(salt, salt);
    expect(readLogEntry(entry)).toEqual({ tag: salt, commitment: salt });
    expect(() => readLogEntry(entry.with(0, 1))).toThrow(UnknownFormError);
    expect(() => readLogEntry(entry.slice(1))).toThrow(UnknownFormError);
  });
});

describe('writing an entry', () => {
  const file = (n: number) => ({ sha256: fromHex(hash), salt: new Uint8Array(32).fill(n) });
  const entry = {
    kind: 'entry' as const,
    caseId: fromHex(header.case),
    seq: 0,
    prev: null,
    recordedAt: header.recordedAt,
    occurredAt: null,
    parts: { shown: { value: { v: 1 as const, text: 'x' }, salt: new Uint8Array(32).fill(1) } },
    photos: [{ n: 1, visibility: 'shared' as const, original: file(2), published: file(3) }],
    names: [],
    after: null,
    visibility: 'shared' as const,
    salt: new Uint8Array(32).fill(4),
  };

  test('it joins what the single steps give', () => {
    const written = writeEntry(entry);
    expect(written.header.parts.shown).toBe(toHex(written.parts.shown!.commitment));
    expect(written.entry).toEqual(logEntry(written.tag, written.commitment));
    expect(readHeader(written.headerBytes)).toEqual(written.header);
  });

  test('a salt used twice, or a part of another shape, is refused', () => {
    expect(() => writeEntry({ ...entry, salt: entry.parts.shown.salt })).toThrow(ShapeError);
    const photos = [{ ...entry.photos[0]!, published: entry.photos[0]!.original }];
    expect(() => writeEntry({ ...entry, photos })).toThrow(ShapeError);
    const shown = { ...entry.parts.shown, value: { v: 1 as const, text: 'x', more: 1 } };
    expect(() => writeEntry({ ...entry, parts: { shown } })).toThrow(ShapeError);
  });
});
