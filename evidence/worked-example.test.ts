import { expect, test } from 'vitest';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { headerBytes } from '#evidence/seal/header-bytes.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { logEntry } from '#evidence/seal/log-entry.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import { photoCommitment } from '#evidence/seal/photo-commitment.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';

// Computed twice by two hands, apart from this program, before it was written.
const salt = (byte: number) => new Uint8Array(32).fill(byte);
const caseId = '00112233445566778899aabbccddeeff';
const part = 'f212dc7fa27a06e593131a4dac1b9e53a47b2279e529d1d289e0f25b07f0cc32';
const original = '9ff875ffb1c511e9a59f956efac5860840129c2e0a4e6089d621ae4ed98b31b5';
const published = 'd56a379fb53b54ab8dbc778bf98e368170c40de5b818d797854ee6852fb9cc09';
const commitment = '0063c5923744ce35569bc7d911ac604eecf5d2a10ca36459e478f71fcc4d8e12';
const tag = '35adc87fb178a35ef0bb62fa3c8fa26f0ca0bca2836e993833c14a04551f3ee8';
const leaf = 'b24bd761214ffdc85b491dbb8f29e53a60eca1622b83cb83d1475e9219189ca1';

const header = {
  v: 1 as const,
  kind: 'entry',
  case: caseId,
  seq: 0,
  prev: null,
  recordedAt: '2026-04-09T09:12:44.318Z',
  occurredAt: null,
  parts: { shown: part },
  photos: [{ n: 1, original, published, visibility: 'shared' as const }],
  names: [],
  after: null,
  visibility: 'shared' as const,
};
const headerText =
  `{"after":null,"case":"${caseId}","kind":"entry","names":[],"occurredAt":null,` +
  `"parts":{"shown":"${part}"},"photos":[{"n":1,"original":"${original}",` +
  `"published":"${published}","visibility":"shared"}],"prev":null,` +
  `"recordedAt":"2026-04-09T09:12:44.318Z","seq":0,"v":1,"visibility":"shared"}`;

test('the part', () => {
  const bytes = sealJson({ v: 1, text: 'Bridge lifted at the bass side, 0.4 mm.' });
  expect(fromUtf8(bytes)).toBe('{"text":"Bridge lifted at the bass side, 0.4 mm.","v":1}');
  expect(toHex(partCommitment('shown', salt(1), bytes))).toBe(part);
});

test('the two files of the photo', () => {
  const hash = (text: string) => sha256(toUtf8(text));
  expect(toHex(photoCommitment('original', salt(2), hash('not really a photo')))).toBe(original);
  expect(toHex(photoCommitment('published', salt(3), hash('published copy')))).toBe(published);
});

test('the header and its commitment', () => {
  const bytes = headerBytes(header);
  expect(bytes).toHaveLength(471);
  expect(fromUtf8(bytes)).toBe(headerText);
  expect(readHeader(bytes)).toEqual(header);
  expect(toHex(headerCommitment(salt(4), bytes))).toBe(commitment);
});

test('the slot, the log entry and its leaf hash', () => {
  expect(toHex(slotTag(fromHex(caseId), 0))).toBe(tag);
  const entry = logEntry(fromHex(tag), fromHex(commitment));
  expect(toHex(entry)).toBe(`02${tag}${commitment}`);
  expect(toHex(leafHash(entry))).toBe(leaf);
});
