import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import type { Bundle, BundleEntry } from '#evidence/bundle/bundle-shape.ts';
import { readBundle } from '#evidence/bundle/read-bundle.ts';
import { writeBundle } from '#evidence/bundle/write-bundle.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import type { StandingShown } from '#evidence/chain/case-shown.ts';
import { codeOfBits } from '#evidence/code/draw-code.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { parseCode } from '#evidence/code/parse-code.ts';
import { qrFragment, readQrFragment } from '#evidence/code/qr-fragment.ts';
import { credentialHash } from '#evidence/credential/credential-hash.ts';
import type { Credential } from '#evidence/credential/credential-shape.ts';
import { readCredential } from '#evidence/credential/read-credential.ts';
import { signCredential } from '#evidence/credential/sign-credential.ts';
import { readCompactJws } from '#evidence/jws/compact-jws.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { readStanding } from '#evidence/standing/read-standing.ts';
import { signStanding } from '#evidence/standing/sign-standing.ts';
import type { Standing } from '#evidence/standing/standing-shape.ts';
import { standingWord } from '#evidence/standing/standing-word.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { blockOf, examplesOf, linesOf, pages } from '#tests/evidence/read-page.ts';

type Example = (name: string) => string;
const signerOf = (example: Example) => {
  return { keyId: example('kid'), secretKey: fromHex(example('secret')) };
};
const keyOf = (example: Example) => (kid: string) =>
  kid === example('kid') ? ed25519PublicKey(fromHex(example('secret'))) : null;

test('credential', () => {
  const [example] = examplesOf('credential');
  const jws = blockOf('credential', 'text jws').trimEnd();
  const payload = JSON.parse(example!('payload')) as Credential;
  expect(signCredential(payload, signerOf(example!))).toBe(jws);
  expect(readCredential(jws, keyOf(example!)).payload).toEqual(payload);
  expect(readCompactJws(jws).header).toEqual(JSON.parse(example!('header')));
  expect(toHex(credentialHash(jws))).toBe(example!('sha256'));
});

test('standing', () => {
  const [example] = examplesOf('standing');
  const jws = blockOf('standing', 'text jws').trimEnd();
  const standing = JSON.parse(example!('payload')) as Standing;
  expect(signStanding(standing, signerOf(example!))).toBe(jws);
  expect(readStanding(jws, keyOf(example!)).standing).toEqual(standing);
  expect(readCompactJws(jws).header).toEqual(JSON.parse(example!('header')));
  expect(standing.checkpoint).toBe(blockOf('checkpoint', 'text checkpoint'));
  const [until, later] = ['2028-05-01T23:59:59.999Z', '2028-05-02T00:00:00.000Z'];
  for (const line of linesOf('standing', 'words')) {
    const [, acts, when, word] = /^(\S+) (before|after) (.+)$/.exec(line)!;
    const done = acts === '–' ? [] : (acts!.split(',') as StandingShown['act'][]);
    expect(standingWord(done, until, when === 'before' ? until : later)).toBe(word);
  }
});

test('code-and-qr', () => {
  const [example, unlucky] = examplesOf('code-and-qr');
  const code = example!('code');
  expect(codeOfBits(fromHex(example!('random')))).toBe(code);
  expect(formatCode(code)).toBe(example!('printed'));
  expect(parseCode(example!('typed'))).toBe(code);
  expect(unlucky!('code')).toBe('none');
  expect(codeOfBits(fromHex(unlucky!('random')))).toBeNull();
  const seal = fromHex(example!('seal value'));
  const logKeyId = example!('log key id');
  expect(qrFragment(seal, logKeyId)).toBe(example!('fragment'));
  expect(readQrFragment(example!('fragment'))).toEqual({ seal16: seal.slice(0, 16), logKeyId });
});

const text = blockOf('bundle', 'text bundle');
const logKeyId = examplesOf('keys')[0]!('id');

test('bundle', () => {
  const read = readBundle(text)!;
  expect(read.unknownMembers).toEqual([]);
  expect(writeBundle(read.bundle)).toBe(text);
  expect(read.bundle.credential).toBe(blockOf('credential', 'text jws').trimEnd());
  expect(read.bundle.standing).toBe(blockOf('standing', 'text jws').trimEnd());
  const report = verifyBundle(text, { logKeyId });
  expect([report.verdict, report.standing.word]).toEqual(['Intact', 'in force']);
  expect(report.record?.sealValue).toBe(examplesOf('code-and-qr')[0]!('seal value'));
});

describe('verifying', () => {
  const change: Record<string, (bundle: Bundle) => void> = {
    unchanged: () => {},
    'no key id from outside': () => {},
    'another key id from outside': () => {},
    'one letter of the close\u2019s text': (bundle) => {
      const { shown } = (bundle.entries[3] as BundleEntry).parts;
      shown!.bytes = shown!.bytes.replace('Bridge', 'bridge');
    },
    'the last entry left out': (bundle) => bundle.entries.pop(),
    'the standing left out': (bundle) => (bundle.standing = null),
    'a member nobody named': (bundle) => Object.assign(bundle, { remark: '' }),
    'another format': (bundle) => Object.assign(bundle, { format: 'a-file/1' }),
  };
  const outside: Record<string, { logKeyId?: string }> = {
    'no key id from outside': {},
    'another key id from outside': { logKeyId: '00'.repeat(16) },
  };
  const lines = linesOf('verifying', 'verdicts').map((line) => line.split(': '));

  test('the page names every change there is', () => {
    const named = lines.map(([name]) => name!.replace("'", '\u2019'));
    expect(named.toSorted()).toEqual(Object.keys(change).toSorted());
  });

  test.each(lines)('%s: %s', (name, verdict) => {
    const bundle = structuredClone(readBundle(text)!.bundle);
    const key = name.replace("'", '\u2019');
    change[key]!(bundle);
    const report = verifyBundle(JSON.stringify(bundle), outside[key] ?? { logKeyId });
    expect(report.verdict).toBe(verdict);
  });
});

test('pages lead to pages and code that are there', () => {
  for (const page of pages) {
    const at = new URL(`../docs/formats/${page}.md`, import.meta.url);
    const content = readFileSync(at, 'utf8');
    const links = [...content.matchAll(/\]\(([^)]+)\)/g)].map(([, link]) => new URL(link!, at));
    const code = [...content.matchAll(/`(evidence\/[^`]*)`/g)].map(
      ([, path]) => new URL(`../${path}`, import.meta.url),
    );
    for (const target of [...links, ...code]) expect(existsSync(target), target.href).toBe(true);
  }
});
