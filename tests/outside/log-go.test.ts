import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { toBase64 } from '#evidence/bytes/base64.ts';
import { readConsistency } from '#evidence/proof/consistency-text.ts';
import { readTlogProof } from '#evidence/proof/tlog-proof.ts';
import { cosignCheckpoint } from '#evidence/note/cosign-checkpoint.ts';
import { tellCase } from '#tests/evidence/told-case.ts';
import { secretOf } from '#tests/evidence/witness-shop.ts';

// The reference is golang.org/x/mod/sumdb/{note,tlog} as Debian packages it: the code that checks
// Go's own checksum database, written without any knowledge of ours.
const SOURCES = '/usr/share/gocode';
const program = fileURLToPath(new URL('./go/read-log.go', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'witnessmark-go-'));
const binary = join(folder, 'read-log');
const { shop } = tellCase();
const size = shop.log.length;
const root = toBase64(shop.root());
const vkey = shop.vkeys[0]!;

beforeAll(() => {
  if (!existsSync(join(SOURCES, 'src/golang.org/x/mod/sumdb/tlog'))) {
    throw new Error('Go’s log reader is missing. apt-get install golang-golang-x-mod-dev');
  }
  const env = {
    ...process.env,
    GO111MODULE: 'off',
    GOPATH: SOURCES,
    GOCACHE: join(folder, 'cache'),
    GOFLAGS: '',
    GOTOOLCHAIN: 'local',
  };
  const built = spawnSync('go', ['build', '-o', binary, program], { env, encoding: 'utf8' });
  if (built.error) throw new Error('Go is missing. apt-get install golang-go');
  if (built.status !== 0) throw new Error(`Go could not build its reader: ${built.stderr}`);
}, 300_000);

afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** What the Go program says to each question: nothing when all is right. */
function ask(questions: object[]): string[] {
  const run = spawnSync(binary, { input: JSON.stringify(questions), encoding: 'utf8' });
  expect(run.stderr).toBe('');
  const answers = JSON.parse(run.stdout) as string[];
  expect(answers).toHaveLength(questions.length);
  return answers;
}

const right = (questions: object[]) => questions.map(() => '');
const damaged = (text: string) => (text.startsWith('A') ? 'B' : 'A') + text.slice(1);

test('Go opens our checkpoint with our key, cosigned or not', () => {
  const note = shop.checkpoint();
  const question = { ask: 'checkpoint', vkey, note, origin: shop.origin, size, root };
  const witness = { name: `${shop.origin}/witness`, secretKey: secretOf('witness') };
  const cosigned = cosignCheckpoint(note, witness, 1_776_000_000);
  expect(ask([question, { ...question, note: cosigned }])).toEqual(['', '']);
});

test('Go refuses our checkpoint when a line of it or its signature is altered', () => {
  const note = shop.checkpoint();
  const question = { ask: 'checkpoint', vkey, note, origin: shop.origin, size, root };
  const lines = note.split('\n');
  const altered = [
    note.replace(`\n${size}\n`, `\n${size + 1}\n`),
    note.replace(lines[2]!, damaged(lines[2]!)),
    note.replace(/(— \S+ \S{20})\S/, '$1/'),
    note.replace('\n\n', '\n'),
  ].map((text) => ({ ...question, note: text }));
  const other = { ...question, vkey: shop.vkeyOf(secretOf('another')) };
  expect(ask([...altered, other]).every((answer) => answer !== '')).toBe(true);
});

test('Go builds the same tree from our entries', () => {
  const entries = shop.log.map(({ entry }) => toBase64(entry));
  const questions = entries.map((_, at) => {
    const upTo = at + 1;
    return { ask: 'root', entries: entries.slice(0, upTo), root: toBase64(shop.root(upTo)) };
  });
  expect(ask(questions)).toEqual(right(questions));
  expect(ask([{ ...questions[4], root }])[0]).not.toBe('');
});

test('Go takes every inclusion proof of ours, and none that is altered', () => {
  const questions = shop.log.map((sealed) => {
    const { index, hashes } = readTlogProof(shop.proof(sealed, shop.checkpoint(), size));
    const proof = hashes.map(toBase64);
    return { ask: 'inclusion', index, size, root, proof, entry: toBase64(sealed.entry) };
  });
  expect(ask(questions)).toEqual(right(questions));
  const wrong = questions.flatMap((question) => [
    { ...question, index: (question.index + 1) % size },
    { ...question, root: damaged(root) },
    { ...question, entry: damaged(question.entry) },
    ...question.proof.map((hash, at) => ({
      ...question,
      proof: question.proof.with(at, damaged(hash)),
    })),
  ]);
  expect(ask(wrong).every((answer) => answer !== '')).toBe(true);
});

test('Go takes every consistency proof of ours, and none that is altered', () => {
  const questions = shop.log.slice(1).map((_, at) => {
    const oldSize = at + 1;
    const { hashes } = readConsistency(shop.growth(oldSize));
    const oldRoot = toBase64(shop.root(oldSize));
    return { ask: 'consistency', oldSize, oldRoot, size, root, proof: hashes.map(toBase64) };
  });
  expect(ask(questions)).toEqual(right(questions));
  const wrong = questions.flatMap((question) => [
    { ...question, oldRoot: damaged(question.oldRoot) },
    { ...question, root: damaged(root) },
    { ...question, oldSize: question.oldSize === 1 ? 2 : question.oldSize - 1 },
    ...question.proof.map((hash, at) => ({
      ...question,
      proof: question.proof.with(at, damaged(hash)),
    })),
  ]);
  expect(ask(wrong).every((answer) => answer !== '')).toBe(true);
});
