import { describe, expect, test } from 'vitest';
import { fromBase64, toBase64 } from '#evidence/bytes/base64.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { EvidenceError } from '#evidence/errors.ts';
import { readSealedJson } from '#evidence/json/read-sealed-json.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { ed25519Spki } from '#evidence/key/ed25519-spki.ts';
import { keyId } from '#evidence/key/key-id.ts';
import { isOrigin } from '#evidence/log/origin.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';
import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { rootOfLeaves } from '#evidence/merkle/root-of-leaves.ts';
import { cosignCheckpoint } from '#evidence/note/cosign-checkpoint.ts';
import { readCheckpoint } from '#evidence/note/read-checkpoint.ts';
import { readNote } from '#evidence/note/read-note.ts';
import { signCheckpoint } from '#evidence/note/sign-checkpoint.ts';
import { encodeVkey, LOG_TYPE, WITNESS_TYPE } from '#evidence/note/vkey.ts';
import { writeConsistency } from '#evidence/proof/consistency-text.ts';
import { writeTlogProof } from '#evidence/proof/tlog-proof.ts';
import { headerBytes } from '#evidence/seal/header-bytes.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import type { Kind } from '#evidence/seal/kinds.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { logEntry } from '#evidence/seal/log-entry.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import { photoCommitment, type PhotoCopy } from '#evidence/seal/photo-commitment.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';
import { entriesPath, tilePath, tileWidth } from '#evidence/tiles/tile-path.ts';
import { blockOf, examplesOf, linesOf, pages } from '#tests/evidence/read-page.ts';

test('sealed-json', () => {
  const [example] = examplesOf('sealed-json');
  const bytes = sealJson(JSON.parse(example!('entered')));
  expect(fromUtf8(bytes)).toBe(example!('bytes'));
  expect(bytes).toHaveLength(Number(example!('length')));
  expect(toHex(sha256(bytes))).toBe(example!('sha256'));
  for (const line of linesOf('sealed-json', 'refused')) {
    expect(JSON.parse(line)).toBeTypeOf('object');
    expect(() => readSealedJson(toUtf8(line))).toThrow(EvidenceError);
  }
});

test('parts', () => {
  for (const example of examplesOf('parts')) {
    const bytes = toUtf8(example('bytes'));
    const commitment = partCommitment(example('name'), fromHex(example('salt')), bytes);
    expect(toHex(commitment)).toBe(example('commitment'));
    expect(readSealedJson(bytes)).toMatchObject({ v: 1 });
  }
});

test('case-chain', () => {
  const lines = linesOf('case-chain', 'shown');
  for (const line of lines) {
    const [, kind, shown, hash] = /^(\S+) (\{.*\}) ([0-9a-f]{64})$/.exec(line)!;
    const bytes = toUtf8(shown!);
    expect(fromUtf8(sealJson(readPart(kind as Kind, 'shown', bytes)))).toBe(shown);
    expect(toHex(sha256(bytes))).toBe(hash);
  }
  expect(lines).toHaveLength(10);
});

test('photo-commitment', () => {
  for (const example of examplesOf('photo-commitment')) {
    const hash = sha256(toUtf8(example('file')));
    expect(toHex(hash)).toBe(example('file sha256'));
    const copy = example('copy') as PhotoCopy;
    const commitment = photoCommitment(copy, fromHex(example('salt')), hash);
    expect(toHex(commitment)).toBe(example('commitment'));
  }
});

describe('header-and-log-entry', () => {
  const [example] = examplesOf('header-and-log-entry');
  const header = readHeader(toUtf8(example!('header')));

  test('the header is written so, and holds what the pages before it give', () => {
    const bytes = headerBytes(header);
    expect(fromUtf8(bytes)).toBe(example!('header'));
    expect(bytes).toHaveLength(Number(example!('length')));
    expect(header.parts.shown).toBe(examplesOf('parts')[0]!('commitment'));
    const photos = examplesOf('photo-commitment').map((photo) => photo('commitment'));
    expect([header.photos[0]!.original, header.photos[0]!.published]).toEqual(photos);
  });

  test('C, T, the entry and its leaf follow', () => {
    const C = headerCommitment(fromHex(example!('salt')), toUtf8(example!('header')));
    const T = slotTag(fromHex(example!('case')), Number(example!('seq')));
    const entry = logEntry(T, C);
    expect([C, T, entry, leafHash(entry)].map(toHex)).toEqual(
      ['C', 'T', 'entry', 'leaf'].map(example!),
    );
    expect([header.case, header.seq]).toEqual([example!('case'), Number(example!('seq'))]);
  });
});

test('own-chain', () => {
  let prev: string | null = null;
  for (const example of examplesOf('own-chain')) {
    const header = readHeader(toUtf8(example('header')));
    const shown = toUtf8(example('shown'));
    const part = partCommitment('shown', fromHex(example('shown salt')), shown);
    expect(header.parts).toEqual({ shown: toHex(part) });
    expect(header).toMatchObject({ seq: Number(example('index')), prev });
    expect(readPart(header.kind as Kind, 'shown', shown)).toMatchObject({ v: 1 });
    const C = headerCommitment(fromHex(example('salt')), toUtf8(example('header')));
    expect(toHex(C)).toBe(example('commitment'));
    const entry = logEntry(slotTag(new Uint8Array(16), header.seq), C);
    expect(toHex(leafHash(entry))).toBe(example('leaf'));
    prev = example('commitment');
  }
});

test('keys', () => {
  const [log, credential] = examplesOf('keys');
  for (const example of [log!, credential!]) {
    const publicKey = ed25519PublicKey(fromHex(example('secret')));
    const spki = ed25519Spki(publicKey);
    expect([publicKey, spki].map(toHex)).toEqual([example('public'), example('spki')]);
    expect(keyId(spki)).toBe(example('id'));
  }
  const origin = log!('origin');
  const publicKey = fromHex(log!('public'));
  expect(isOrigin(origin)).toBe(true);
  expect(encodeVkey({ name: origin, type: LOG_TYPE, publicKey })).toBe(log!('vkey'));
  const witness = encodeVkey({ name: `${origin}/witness`, type: WITNESS_TYPE, publicKey });
  expect(witness).toBe(log!('witness'));
});

test('checkpoint', () => {
  const [log, witness] = examplesOf('checkpoint');
  const note = blockOf('checkpoint', 'text checkpoint');
  const root = fromBase64(log!('root'));
  const head = { origin: log!('origin'), size: Number(log!('size')), root };
  expect(signCheckpoint(head, fromHex(log!('secret')))).toBe(note);
  const vkeys = [examplesOf('keys')[0]!('vkey')];
  const read = readCheckpoint(note, { origin: head.origin, vkeys });
  expect(toHex(sha256(read.stamped))).toBe(log!('stamped sha256'));

  const cosigned = blockOf('checkpoint', 'text cosigned');
  const signer = { name: witness!('name'), secretKey: fromHex(witness!('secret')) };
  expect(cosignCheckpoint(note, signer, Number(witness!('seconds')))).toBe(cosigned);
  const known = readNote(cosigned, [witness!('vkey')]).signatures.filter(({ vkey }) => vkey);
  expect(known).toHaveLength(1);
  expect(readCheckpoint(cosigned, { origin: head.origin, vkeys }).stamped).toEqual(read.stamped);
});

describe('proof', () => {
  const leaves = linesOf('proof', 'leaves').map((line) => fromHex(line, 32));
  const [example] = examplesOf('proof');
  const nodes = new Map<string, Uint8Array>();
  const read = (level: number, index: number) => nodes.get(`${level}/${index}`)!;
  const stored = leaves.map((leaf, index) => {
    const made = nodesOfAppend(index, leaf, read);
    for (const node of made) nodes.set(`${node.level}/${node.index}`, node.hash);
    return made.map(({ level, index: at, hash }) => `${level} ${at} ${toHex(hash)}`);
  });
  const checkpoint = blockOf('checkpoint', 'text checkpoint');

  test('the leaves are those of the pages before it, and the roots follow', () => {
    const known = [...examplesOf('own-chain'), examplesOf('header-and-log-entry')[0]!];
    expect(leaves.slice(0, 4).map(toHex)).toEqual(known.map((one) => one('leaf')));
    expect(toHex(rootOfLeaves(leaves))).toBe(example!('root'));
    expect(toHex(rootOfLeaves(leaves.slice(0, 4)))).toBe(example!('root of 4'));
    expect(toBase64(rootOfLeaves(leaves))).toBe(examplesOf('checkpoint')[0]!('root'));
  });

  test('the nodes stored, the proofs as text, the paths', () => {
    expect(stored[3]).toEqual(linesOf('proof', 'nodes'));
    const inclusion = { index: 3, hashes: proveInclusion(3, leaves.length, read), checkpoint };
    expect(writeTlogProof(inclusion)).toBe(blockOf('proof', 'text inclusion'));
    const growth = { old: 4, hashes: proveConsistency(4, leaves.length, read), checkpoint };
    expect(writeConsistency(growth)).toBe(blockOf('proof', 'text consistency'));
    for (const line of linesOf('proof', 'tiles')) {
      const [level, index, path] = line.split(' ') as [string, string, string];
      const width = tileWidth(Number(level), Number(index), 70_000);
      expect(tilePath(Number(level), Number(index), width)).toBe(path);
    }
    expect(entriesPath(273, 112)).toBe('tile/entries/273.p/112');
  });
});

test('every page is read by a test', () => {
  const here = [
    'README',
    'sealed-json',
    'parts',
    'case-chain',
    'own-chain',
    'photo-commitment',
    'header-and-log-entry',
    'keys',
    'checkpoint',
    'proof',
  ];
  const inWarranty = ['credential', 'standing', 'code-and-qr', 'bundle', 'verifying'];
  expect(pages.toSorted()).toEqual([...here, ...inWarranty].toSorted());
});
