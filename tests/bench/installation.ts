import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { makeDemoKeys } from '#local/demo-keys.ts';
import { freePort } from '#local/ports.ts';
import { serverEnvironment } from '#local/server-environment.ts';
import { startStandIns } from '#local/stand-ins.ts';
import { Supervisor } from '#local/supervisor.ts';

/** The built program with stand-ins of its own, for measuring. */
export interface Installation {
  url: string;
  /** Starts serving; before it the database may be filled. */
  serve: () => Promise<void>;
  stop: () => Promise<void>;
}

/** Starts the stand-ins in a temporary folder and points this process's environment at them. */
export async function install(): Promise<Installation> {
  const folder = await mkdtemp(join(tmpdir(), 'witnessmark-bench-'));
  const supervisor = new Supervisor(join(folder, 'logs'));
  const keys = makeDemoKeys();
  const ports = { mailPage: 0, identity: 0, store: 0, smtp: 0, database: 0 };
  const port = await freePort();
  const { services } = await startStandIns(supervisor, folder, { ...ports, web: port }, keys);
  const env = serverEnvironment(services, keys, { port, keysFolder: join(folder, 'keys') });
  Object.assign(process.env, env);
  const { migrate } = await import('#server/db/migrate.ts');
  await migrate();
  return {
    url: env.PUBLIC_URL,
    serve: () =>
      supervisor.startWeb(
        { name: 'The server', module: 'server/main.ts', logName: 'web', env: { ...process.env } },
        `${env.PUBLIC_URL}/api/health`,
      ),
    stop: async () => {
      await supervisor.stop();
      await rm(folder, { recursive: true, force: true });
    },
  };
}
