import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import {
  cp,
  mkdir,
  mkdtemp,
  readFile,
  readdir,
  readlink,
  rm,
  symlink,
  writeFile,
} from 'node:fs/promises';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import { freePort } from '#local/ports.ts';
import { sourcesDigest } from './build.mjs';

// The start command in a project of its own: the real scripts and stand-ins, with small programs in the place of
// the migration, the demo shop and the server.
const programs = {
  'server/db/migrate.ts': `
    import { createConnection } from 'mariadb';
    export async function migrate(url: string) {
      const connection = await createConnection(url);
      await connection.query('CREATE TABLE IF NOT EXISTS starts (at TIMESTAMP)');
      await connection.query('INSERT INTO starts VALUES (NOW())');
      await connection.end();
    }`,
  'seeds/demo-owners.ts': `
    export const demoOwners = [{ name: 'Ada Fenn', email: 'ada@owner.example', has: 'a lute' }];`,
  'seeds/load.ts': `
    import { appendFileSync } from 'node:fs';
    if (process.env.SEED_FAILS) {
      console.error('The demo shop could not be loaded.');
      process.exit(1);
    }
    appendFileSync('seeded.txt', 'seeded ');`,
  'server/main.ts': `
    import { createServer } from 'node:http';
    import { createConnection } from 'mariadb';
    const server = createServer(async (request, response) => {
      const connection = await createConnection(process.env.DATABASE_URL ?? '');
      const rows = await connection.query('SELECT COUNT(*) AS n FROM starts');
      await connection.end();
      response.end(String(rows[0].n));
    });
    server.listen(Number(process.env.PORT), process.env.HOST);
    process.once('SIGTERM', () => server.close(() => process.exit(0)));`,
};

let root = '';
let ports: Record<string, string> = {};
const started: ChildProcess[] = [];

beforeAll(async () => {
  root = await mkdtemp(join(tmpdir(), 'witnessmark-start-'));
  for (const name of ['scripts', 'local', 'package.json', 'package-lock.json'])
    await cp(name, join(root, name), { recursive: true });
  await symlink(join(process.cwd(), 'node_modules'), join(root, 'node_modules'));
  for (const [path, code] of Object.entries(programs)) {
    await mkdir(join(root, path, '..'), { recursive: true });
    await writeFile(join(root, path), code);
  }
  await mkdir(join(root, 'build'));
  await writeFile(join(root, 'build/sources.sha256'), sourcesDigest(root));
});

beforeEach(async () => {
  const names = [
    'PORT',
    'MAIL_PAGE_PORT',
    'IDENTITY_PORT',
    'STORE_PORT',
    'SMTP_PORT',
    'DATABASE_PORT',
  ];
  ports = {};
  for (const name of names) ports[name] = String(await freePort());
});

afterEach(async () => {
  for (const child of started.splice(0)) {
    child.kill('SIGTERM');
    if (child.exitCode === null && child.signalCode === null)
      await new Promise((resolve) => child.once('exit', resolve));
  }
});

afterAll(() => rm(root, { recursive: true, force: true }));

interface Run {
  child: ChildProcess;
  output: () => string;
  /** Resolves with the exit code. */
  ended: Promise<number | null>;
  /** Resolves when the output has these words; throws when it ends without them. */
  says: (words: string) => Promise<void>;
}

function npmStart(env: Record<string, string> = {}): Run {
  const child = spawn(process.execPath, ['scripts/start.mjs'], {
    cwd: root,
    env: { PATH: process.env.PATH, ...ports, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  started.push(child);
  let output = '';
  const ended = new Promise<number | null>((resolve) => child.once('close', resolve));
  child.stdout.on('data', (chunk) => (output += String(chunk)));
  child.stderr.on('data', (chunk) => (output += String(chunk)));
  const said = (words: string) =>
    new Promise<void>((resolve, reject) => {
      const look = () => output.includes(words) && resolve();
      child.stdout.on('data', look);
      void ended.then(() => reject(new Error(`It ended without saying "${words}":\n${output}`)));
      look();
    });
  return { child, output: () => output, ended, says: said };
}

/** Programs that run with this project as their folder, by their arguments. */
async function running(): Promise<string[]> {
  const all = (await readdir('/proc')).filter((name) => /^\d+$/.test(name));
  const here = await Promise.all(
    all.map(async (pid) => {
      const folder = await readlink(`/proc/${pid}/cwd`).catch(() => '');
      const words = await readFile(`/proc/${pid}/cmdline`, 'utf8').catch(() => '');
      return folder.startsWith(root) && words !== '' ? [words.replaceAll('\0', ' ')] : [];
    }),
  );
  return here.flat();
}

it('starts all, says where and who, keeps the data, seeds once, and leaves nothing running', async () => {
  const first = npmStart();
  await first.says('Ctrl-C stops everything.');
  for (const words of [
    `http://127.0.0.1:${ports.PORT}`,
    `http://127.0.0.1:${ports.MAIL_PAGE_PORT}`,
    'Ines Lund, shop owner',
    'ada@owner.example',
    'Demo keys and demo sign-in',
  ])
    expect(first.output()).toContain(words);
  expect(await (await fetch(`http://127.0.0.1:${ports.PORT}/`)).text()).toBe('1');

  const second = npmStart();
  expect(await second.ended).toBe(1);
  expect(second.output()).toMatch(
    /^Witnessmark is already running here \(process \d+\)\. Use that one, or stop it first: kill \d+\n$/,
  );

  first.child.kill('SIGINT');
  expect(await first.ended).toBe(0);
  expect(await running()).toEqual([]);

  const again = npmStart();
  await again.says('Ctrl-C stops everything.');
  expect(await (await fetch(`http://127.0.0.1:${ports.PORT}/`)).text()).toBe('2');
  expect(await readFile(join(root, 'seeded.txt'), 'utf8')).toBe('seeded ');

  again.child.kill('SIGKILL');
  while ((await running()).length > 0) await new Promise((next) => setImmediate(next));
  const afterCrash = npmStart();
  await afterCrash.says('Ctrl-C stops everything.');
  expect(await (await fetch(`http://127.0.0.1:${ports.PORT}/`)).text()).toBe('3');
}, 240_000);

it('says which port is taken and what to do, and starts nothing', async () => {
  const taken = createServer();
  await new Promise<void>((resolve) => taken.listen(Number(ports.PORT), '127.0.0.1', resolve));
  const start = npmStart();
  expect(await start.ended).toBe(1);
  expect(start.output().trim()).toBe(
    `Witnessmark needs port ${ports.PORT}, which another program is using. Stop that program, or choose another port: PORT=${Number(ports.PORT) + 10} npm start`,
  );
  expect(await running()).toEqual([]);
  taken.close();
});

it('gives the reason of the step that failed, in one sentence, and stops the rest', async () => {
  const start = npmStart({ SEED_FAILS: '1', DATA_DIR: 'other' });
  expect(await start.ended).toBe(1);
  expect(start.output().trim().split('\n').at(-1)).toBe('The demo shop could not be loaded.');
  expect(await running()).toEqual([]);
}, 120_000);
