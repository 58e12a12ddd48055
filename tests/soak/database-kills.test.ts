import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createConnection } from 'mariadb';
import { afterAll, beforeAll, expect, it } from 'vitest';

const kills = 100;
const rowsBeforeKill = 20;
let folder = '';

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'witnessmark-kills-'));
});

afterAll(() => rm(folder, { recursive: true, force: true }));

/** Starts the database as a program of its own, as `npm start` does. */
async function start() {
  const options = {
    directory: join(folder, 'mariadb'),
    port: 0,
    user: 'u',
    password: 'p',
    name: 'd',
  };
  const program = spawn(process.execPath, ['--import', 'tsx', 'local/database.ts'], {
    env: { ...process.env, STAND_IN: JSON.stringify(options) },
    stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
  });
  const [message] = (await once(program, 'message')) as [
    { ready?: { url: string; pid: number }; failed?: string },
  ];
  if (!message.ready) throw new Error(message.failed);
  const connection = await createConnection(message.ready.url);
  connection.on('error', () => undefined);
  return { program, connection, pid: message.ready.pid };
}

it(`loses no acknowledged row in ${kills} kills, and starts again after each`, async () => {
  let acknowledged = 0;
  for (let kill = 0; kill < kills; kill += 1) {
    const { program, connection, pid } = await start();
    await connection.query('CREATE TABLE IF NOT EXISTS rows_kept (n INT PRIMARY KEY)');
    const [found] = await connection.query<{ n: bigint }[]>('SELECT COUNT(*) AS n FROM rows_kept');
    expect(Number(found?.n)).toBeGreaterThanOrEqual(acknowledged);
    acknowledged = Number(found?.n);
    const ended = once(program, 'exit');
    for (let row = 0; row < rowsBeforeKill; row += 1) {
      // The last row is on its way when the server is killed: it may be there afterwards or not.
      const insert = connection.query('INSERT INTO rows_kept VALUES (?)', [acknowledged]);
      if (row === rowsBeforeKill - 1) process.kill(pid, 'SIGKILL');
      if (
        await insert.then(
          () => true,
          () => false,
        )
      )
        acknowledged += 1;
    }
    program.kill('SIGKILL');
    await ended;
  }
  expect(acknowledged).toBeGreaterThanOrEqual(kills * (rowsBeforeKill - 1));
});
