import { describe, expect, test } from 'vitest';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { KeyError, NoteError } from '#evidence/errors.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { checkpointText, readCheckpointText } from '#evidence/note/checkpoint-text.ts';
import { cosignCheckpoint } from '#evidence/note/cosign-checkpoint.ts';
import { readCheckpoint } from '#evidence/note/read-checkpoint.ts';
import { readNote } from '#evidence/note/read-note.ts';
import { signCheckpoint } from '#evidence/note/sign-checkpoint.ts';
import { signNote } from '#evidence/note/sign-note.ts';
import { decodeVkey, encodeVkey, LOG_TYPE, WITNESS_TYPE } from '#evidence/note/vkey.ts';

const origin = 'witnessmark/3f2a9c647d1b4e089a550c6be1d2f713';
const [logSecret, otherSecret] = [new Uint8Array(32).fill(7), new Uint8Array(32).fill(8)];
const logKey = { name: origin, type: LOG_TYPE, publicKey: ed25519PublicKey(logSecret) } as const;
const vkey = encodeVkey(logKey);
const head = { origin, size: 11, root: new Uint8Array(32).fill(5) };
const note = signCheckpoint(head, logSecret);
const log = { origin, vkeys: [vkey] };
const witnessName = 'witnessmark/00000000000040008000000000000000/witness';
const witness = { name: witnessName, secretKey: otherSecret };

test('a checkpoint reads back, with the bytes a time-stamp covers', () => {
  const read = readCheckpoint(note, log);
  expect(read).toMatchObject({ ...head, note, signers: [vkey] });
  expect(fromUtf8(read.stamped)).toBe(note);
});

test('every flipped bit is refused', () => {
  const bytes = Buffer.from(note);
  for (let bit = 0; bit < bytes.length * 8; bit += 1) {
    const damaged = Buffer.from(bytes);
    damaged[bit >> 3]! ^= 1 << (bit & 7);
    // What is no longer UTF-8 never becomes a note; the rest must be refused as one.
    const text = damaged.toString('utf8');
    expect(() => readCheckpoint(text, log)).toThrow(NoteError);
  }
}, 60_000);

describe('a witness', () => {
  const seconds = 1679315147;
  const cosigned = cosignCheckpoint(note, witness, seconds);
  const publicKey = ed25519PublicKey(otherSecret);
  const witnessKey = encodeVkey({ name: witnessName, type: WITNESS_TYPE, publicKey });

  test('adds a line and changes nothing that is stamped', () => {
    expect(cosigned.startsWith(note)).toBe(true);
    expect(fromUtf8(readCheckpoint(cosigned, log).stamped)).toBe(note);
    const { signatures } = readNote(cosigned, [witnessKey]);
    expect(signatures.map((line) => line.vkey)).toEqual([null, witnessKey]);
  });

  test('is refused when its time or line is altered', () => {
    const line = cosigned.slice(note.length);
    // The time's upper bytes are zero, which base64 writes as a run of A.
    const damaged = note + line.replace(/AAA(?=[A-Za-z])/, 'AAB');
    expect(damaged).not.toBe(cosigned);
    expect(() => readNote(damaged, [witnessKey])).toThrow(NoteError);
    expect(() => cosignCheckpoint(note, witness, 0.5)).toThrow(NoteError);
  });

  test('cannot pass for the log', () => {
    expect(() =>
      readNote(cosigned.replace(note, `${note.split('\n\n')[0]}\n\n`), log.vkeys),
    ).toThrow(NoteError);
  });
});

describe("the log's own lines", () => {
  const text = checkpointText(head);
  const lineOf = (secretKey: Uint8Array, name = origin) =>
    signNote(text, { name, secretKey }).slice(text.length + 1);
  const otherVkey = encodeVkey({ ...logKey, publicKey: ed25519PublicKey(otherSecret) });

  test('come first', () => {
    const foreign = lineOf(otherSecret, 'example.org/other');
    expect(readCheckpoint(`${text}\n${lineOf(logSecret)}${foreign}`, log).signers).toEqual([vkey]);
    expect(() => readCheckpoint(`${text}\n${foreign}${lineOf(logSecret)}`, log)).toThrow(NoteError);
  });

  test('are one for each key, of keys the log lists', () => {
    const both = `${text}\n${lineOf(logSecret)}${lineOf(otherSecret)}`;
    const listed = { origin, vkeys: [vkey, otherVkey] };
    expect(readCheckpoint(both, listed).signers).toEqual([vkey, otherVkey]);
    expect(() => readCheckpoint(both, log)).toThrow(NoteError);
    const twice = `${text}\n${lineOf(logSecret)}${lineOf(logSecret)}`;
    expect(() => readCheckpoint(twice, log)).toThrow(NoteError);
  });

  test('must be there', () => {
    const foreign = encodeVkey({ ...logKey, name: 'example.org/other' });
    const unsigned = `${text}\n${lineOf(logSecret, 'example.org/other')}`;
    expect(() => readCheckpoint(unsigned, { origin, vkeys: [foreign] })).toThrow(NoteError);
    expect(() => readCheckpoint(note, { origin: `${origin}0`, vkeys: [vkey] })).toThrow(NoteError);
  });
});

test.each([
  ['an extension line', `${checkpointText(head)}more\n`],
  ['a leading zero', checkpointText(head).replace('\n11\n', '\n011\n')],
  ['a sign', checkpointText(head).replace('\n11\n', '\n+11\n')],
  ['a size beyond 2^53 − 1', checkpointText(head).replace('\n11\n', '\n9007199254740993\n')],
  ['a short root', checkpointText(head).replace(/\n[^\n]+\n$/, '\nBQUF\n')],
  ['no root', `${origin}\n11\n`],
])('%s is no checkpoint', (_, text) => {
  expect(() => readCheckpointText(text)).toThrow(NoteError);
  const signed = signNote(text, { name: origin, secretKey: logSecret });
  expect(() => readCheckpoint(signed, log)).toThrow(NoteError);
});

test.each([
  ['no empty line', note.replace('\n\n', '\n')],
  ['no newline at the end', note.slice(0, -1)],
  ['a carriage return', note.replaceAll('\n', '\r\n')],
  ['a hyphen for the dash', note.replace('— ', '- ')],
  ['two spaces', note.replace('— ', '—  ')],
  ['a line that is nothing', `${note}x\n`],
  ['bytes after it', `${note}\n`],
  ['a tab', note.replace(' ', '\t')],
  ['padding that is not there', note.replace(/=*\n$/, '\n')],
  ['too much of everything', note + `— example.org/a AAAAAAA=\n`.repeat(4000)],
  ['nothing', ''],
])('%s is no note', (_, text) => {
  expect(() => readNote(text, [vkey])).toThrow(NoteError);
});

test('more than sixteen signatures of others do not matter', () => {
  const crowd = note + '— example.org/a AAAAAAA=\n'.repeat(40);
  expect(readCheckpoint(crowd, log).signers).toEqual([vkey]);
});

describe('keys as text', () => {
  test('they read back', () => {
    expect(decodeVkey(vkey)).toMatchObject(logKey);
    expect(encodeVkey(decodeVkey(vkey))).toBe(vkey);
  });

  test.each([
    ['another id', vkey.replace(/\+[0-9a-f]{8}\+/, '+00000000+')],
    ['a capital id', vkey.replace(/\+[0-9a-f]{8}\+/, (id) => id.toUpperCase())],
    ['another type', encodeVkey({ ...logKey, type: 2 as 1 })],
    ['no key', vkey.slice(0, vkey.lastIndexOf('+') + 1)],
    ['a space in the name', vkey.replace('/', ' ')],
    ['padding too much', `${vkey}=`],
    ['nothing', ''],
  ])('%s is refused', (_, text) => {
    expect(() => decodeVkey(text)).toThrow(KeyError);
  });

  test('a name with a space, a plus or nothing in it cannot sign', () => {
    for (const name of ['', 'a b', 'a+b', 'a\u0085b', 'a\u2003b']) {
      expect(() => signNote('x\n', { name, secretKey: logSecret })).toThrow(NoteError);
      expect(() => encodeVkey({ ...logKey, name })).toThrow(KeyError);
    }
    expect(() => signNote('x', { name: 'a', secretKey: logSecret })).toThrow(NoteError);
    expect(() => signNote('x\t\n', { name: 'a', secretKey: logSecret })).toThrow(NoteError);
  });
});

test('a note is text, and text is whole characters', () => {
  expect(() => readNote(note.replace('11', '\ud800'), [vkey])).toThrow();
  expect(toUtf8(note).length).toBeGreaterThan(note.length);
});
