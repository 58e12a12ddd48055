import { spawn } from 'node:child_process';
import { cp, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { freePort } from '#local/ports.ts';

const root = resolve(import.meta.dirname, '../..');
const LEFT_OUT = new Set(['node_modules', '.data', 'build', '.react-router', '.git']);
const PORTS = [
  'PORT',
  'MAIL_PAGE_PORT',
  'IDENTITY_PORT',
  'STORE_PORT',
  'SMTP_PORT',
  'DATABASE_PORT',
];

async function startOnce(folder: string, ports: Record<string, string>): Promise<number> {
  const began = performance.now();
  const child = spawn('npm', ['start'], { cwd: folder, env: { ...process.env, ...ports } });
  let said = '';
  const ready = await new Promise<boolean>((settle) => {
    const read = (piece: Buffer) => {
      said += piece.toString();
      if (said.includes('Witnessmark is running')) settle(true);
    };
    child.stdout.on('data', read);
    child.stderr.on('data', read);
    child.on('exit', () => settle(false));
  });
  const seconds = (performance.now() - began) / 1000;
  const gone = new Promise((done) => child.on('exit', done));
  if (!ready) throw new Error(`npm start did not come up: ${said.trim().split('\n').at(-1)}`);
  child.kill('SIGTERM');
  await gone;
  return seconds;
}

/**
 * Seconds from `npm start` to its screen, on a copy of the sources without packages, build or data
 * (`cold`: installs from the registry, builds, loads the demo), and a second time (`warm`).
 */
export async function startTimes(): Promise<{ cold: number; warm: number }> {
  const folder = await mkdtemp(join(tmpdir(), 'witnessmark-start-'));
  try {
    await cp(root, folder, {
      recursive: true,
      filter: (path) => !LEFT_OUT.has(path.slice(root.length + 1)),
    });
    const ports: Record<string, string> = {};
    for (const name of PORTS) ports[name] = String(await freePort());
    const cold = await startOnce(folder, ports);
    return { cold, warm: await startOnce(folder, ports) };
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}
