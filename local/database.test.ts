import { spawn } from 'node:child_process';
import { cp, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection } from 'mariadb';
import { afterAll, afterEach, beforeAll, beforeEach, expect, it } from 'vitest';
import { startDatabase } from './database.ts';
import type { Database, DatabaseOptions } from './database.ts';
import { installFolder } from './database-folder.ts';
import { freePort } from './ports.ts';
import { startDatabaseProgram } from './stand-ins.ts';
import { Supervisor } from './supervisor.ts';

let template = '';
let folder = '';
const running: Database[] = [];

// Making a data folder takes a second; most tests begin with a copy of one.
beforeAll(async () => {
  template = await mkdtemp(join(tmpdir(), 'witnessmark-database-'));
  await installFolder(join(template, 'mariadb'));
});

afterAll(() => rm(template, { recursive: true, force: true }));

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'witnessmark-database-'));
  await cp(template, folder, { recursive: true });
});

afterEach(async () => {
  for (const database of running.splice(0)) await database.stop();
  await rm(folder, { recursive: true, force: true });
});

async function start(options: Partial<DatabaseOptions> = {}): Promise<Database> {
  const database = await startDatabase({
    directory: join(folder, 'mariadb'),
    port: 0,
    user: 'shop',
    password: 'p&w / ü',
    name: 'shop_1',
    throwaway: true,
    ...options,
  });
  running.push(database);
  return database;
}

async function query<Row>(url: string, ...statements: string[]): Promise<Row[]> {
  const { hostname, port, username, password, pathname } = new URL(url);
  const connection = await createConnection({
    host: hostname,
    port: Number(port),
    user: username,
    password: decodeURIComponent(password),
    database: pathname.slice(1),
  });
  try {
    let rows: Row[] = [];
    for (const statement of statements) rows = await connection.query<Row[]>(statement);
    return rows;
  } finally {
    await connection.end();
  }
}

/** Resolves when no process has this number any more. */
async function gone(pid: number): Promise<void> {
  for (;;) {
    try {
      process.kill(pid, 0);
    } catch {
      return;
    }
    await new Promise((next) => setImmediate(next));
  }
}

it('keeps its data from one start to the next', async () => {
  const first = await start();
  await query(first.url, 'CREATE TABLE kept (word TEXT)', "INSERT INTO kept VALUES ('glue ü 🎻')");
  await first.stop();
  const second = await start();
  expect(await query(second.url, 'SELECT word FROM kept')).toEqual([{ word: 'glue ü 🎻' }]);
});

it('works in UTC and utf8mb4, and refuses values that do not fit', async () => {
  const { url } = await start();
  const [settings] = await query<Record<string, string>>(
    url,
    'SELECT @@time_zone AS zone, @@character_set_server AS characters, @@sql_mode AS mode',
  );
  expect(settings).toMatchObject({ zone: '+00:00', characters: 'utf8mb4' });
  expect(settings?.mode).toContain('STRICT_TRANS_TABLES');
});

it('refuses a second server on the same data folder at once, in one sentence', async () => {
  const { pid } = await start();
  await expect(start()).rejects.toThrow(
    `A database is already running on ${join(folder, 'mariadb')} (process ${pid}). Stop it first: kill ${pid}`,
  );
});

it('starts again after its server was killed, with all that was committed', async () => {
  const first = await start({ throwaway: false });
  await query(first.url, 'CREATE TABLE kept (n INT)', 'INSERT INTO kept VALUES (1), (2)');
  process.kill(first.pid, 'SIGKILL');
  await gone(first.pid);
  const second = await start();
  expect(await query(second.url, 'SELECT COUNT(*) AS rows_kept FROM kept')).toEqual([
    { rows_kept: 2n },
  ]);
});

it('is not kept from starting by a process number that now belongs to another program', async () => {
  await (await start()).stop();
  await writeFile(join(folder, 'mariadb/mariadbd.pid'), String(process.pid));
  await expect(start()).resolves.toMatchObject({ pid: expect.any(Number) });
});

it('says which port is taken', async () => {
  const port = await freePort();
  const other = createServer();
  await new Promise<void>((resolve) => other.listen(port, '127.0.0.1', resolve));
  await expect(start({ port })).rejects.toThrow(
    `The database needs port ${port}, which another program is using.`,
  );
  other.close();
});

it('works in a folder whose path is too long for a socket', async () => {
  const { url } = await start({ directory: join(folder, 'a'.repeat(60), 'b'.repeat(60)) });
  expect(await query(url, 'SELECT 1 AS one')).toEqual([{ one: 1 }]);
});

it('lets nobody in as root over the network, and the shop only into its own databases', async () => {
  const { url } = await start();
  const asRoot = new URL(url);
  asRoot.username = 'root';
  asRoot.password = '';
  await expect(query(asRoot.href, 'SELECT 1')).rejects.toThrow(/Access denied/);
  await expect(query(url, 'SELECT * FROM mysql.global_priv')).rejects.toThrow(/denied/);
});

it('tells the one that watches over it when its server is lost', async () => {
  const told = new Promise<string>((resolve) => {
    const supervisor = new Supervisor(join(folder, 'logs'), (sentence) => {
      resolve(sentence);
      void supervisor.stop();
    });
    void startDatabaseProgram(supervisor, {
      directory: join(folder, 'mariadb'),
      port: 0,
      user: 'a',
      password: 'b',
      name: 'c',
    }).then(({ pid }) => process.kill(pid, 'SIGKILL'));
  });
  expect(await told).toBe('The database has ended by itself (1): MariaDB was ended from outside.');
});

it('ends when the process that started it is killed', async () => {
  const options = {
    directory: join(folder, 'mariadb'),
    port: 0,
    user: 'a',
    password: 'b',
    name: 'c',
  };
  const program = spawn(process.execPath, ['--import', 'tsx', 'local/database.ts'], {
    env: { ...process.env, STAND_IN: JSON.stringify(options) },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const message = await new Promise((resolve) => program.once('message', resolve));
  const { pid } = (message as { ready: { pid: number } }).ready;
  program.kill('SIGKILL');
  await gone(pid);
  await expect(start()).resolves.toMatchObject({ url: expect.stringContaining('mariadb://') });
});
