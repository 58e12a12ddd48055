import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { freePort } from './ports.ts';
import { Supervisor } from './supervisor.ts';

let folder = '';
let diary = '';
let supervisor: Supervisor;
const onLoss = vi.fn<(sentence: string) => void>();

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'witnessmark-supervisor-'));
  diary = join(folder, 'diary');
  onLoss.mockReset();
  supervisor = new Supervisor(join(folder, 'logs'), onLoss);
});

afterEach(async () => {
  supervisor.kill();
  await supervisor.stop();
  await rm(folder, { recursive: true, force: true });
});

const start = (name: string, options: object = {}) =>
  supervisor.startStandIn<{ pid: number }>(
    { name: `The ${name}`, module: 'local/fixtures/stand-in.ts', logName: name },
    { name, diary, ...options },
  );

const runs = (pid: number) => existsSync(`/proc/${pid}`);

async function until(condition: () => boolean): Promise<void> {
  while (!condition()) await new Promise((next) => setImmediate(next));
}

/** Writes a program and gives what `run` and `startWeb` need for it. */
async function program(code: string, env: Record<string, string> = {}) {
  const module = join(folder, 'program.mjs');
  await writeFile(module, code);
  return {
    name: 'The program',
    module,
    logName: 'program',
    env: { PATH: process.env.PATH, ...env },
  };
}

it('starts in order and stops in reverse order', async () => {
  await start('one');
  await start('two');
  await supervisor.stop();
  const lines = (await readFile(diary, 'utf8')).trim().split('\n');
  expect(lines).toEqual(['one started', 'two started', 'two stopped', 'one stopped']);
  expect(onLoss).not.toHaveBeenCalled();
});

it('gives the sentence of the one that does not start, and starts nothing after it was stopped', async () => {
  await start('one');
  await expect(start('two', { fails: 'The glue pot is cold.' })).rejects.toThrow(
    /^The glue pot is cold\.$/,
  );
  await supervisor.stop();
  await expect(start('three')).rejects.toThrow('Stopped.');
});

it('tells in one sentence which one ended by itself', async () => {
  const { pid } = await start('one');
  const told = new Promise((resolve) => onLoss.mockImplementation(resolve));
  process.kill(pid, 'SIGKILL');
  expect(await told).toBe('The one has ended by itself (SIGKILL).');
});

it('ends at once what does not stop when it is told to, with all that it started', async () => {
  const { pid } = await start('stubborn', { stubborn: true });
  const stopping = supervisor.stop();
  supervisor.kill();
  await stopping;
  expect(runs(pid)).toBe(false);
});

it('leaves nothing running when it is killed itself', async () => {
  const process_ = spawn(process.execPath, ['--import', 'tsx', 'local/fixtures/supervising.ts'], {
    env: { ...process.env, DIARY: diary },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const [chunk] = (await once(process_.stdout, 'data')) as [Buffer];
  const pid = Number(String(chunk));
  expect(runs(pid)).toBe(true);
  process_.kill('SIGKILL');
  await until(() => !runs(pid));
  expect(await readFile(diary, 'utf8')).toBe('one started\none stopped\n');
});

it('runs a program to its end, and gives its last words when it fails', async () => {
  await supervisor.run(await program('console.log(process.env.WORD)', { WORD: 'planed' }));
  expect(await readFile(join(folder, 'logs/program.log'), 'utf8')).toBe('planed\n');
  const failing = await program(
    "console.error('a warning'); console.error('The migration 0007 failed.'); process.exitCode = 3",
  );
  await expect(supervisor.run(failing)).rejects.toThrow(/^The migration 0007 failed\.$/);
});

it('waits for a web server until it answers', async () => {
  const port = await freePort();
  const serving = await program(
    "import { createServer } from 'node:http'; createServer((q, r) => r.end()).listen(Number(process.env.PORT), '127.0.0.1')",
    { PORT: String(port) },
  );
  const url = `http://127.0.0.1:${port}/`;
  await supervisor.startWeb(serving, url);
  expect((await fetch(url)).status).toBe(200);
});

it('gives the last words of a web server that ends before it answers', async () => {
  const failing = await program("console.error('SMTP_URL is needed.'); process.exit(1)");
  const url = `http://127.0.0.1:${await freePort()}/`;
  await expect(supervisor.startWeb(failing, url)).rejects.toThrow(/^SMTP_URL is needed\.$/);
});
