import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';
import { build } from '../scripts/build.mjs';
import { sentenceFor } from '../scripts/sentences.mjs';
import { keepDemoKeys } from './demo-keys.ts';
import { choosePorts } from './port-settings.ts';
import { startScreen } from './screen.ts';
import { serverEnvironment } from './server-environment.ts';
import { startStandIns } from './stand-ins.ts';
import { holdStartLock } from './start-lock.ts';
import { Supervisor } from './supervisor.ts';

// The second half of `npm start`: everything after installing. Run from the project's folder.
const root = process.cwd();
const folder = resolve(root, process.env.DATA_DIR ?? '.data');
const say = (line: string) => console.log(line);

async function start(supervisor: Supervisor): Promise<void> {
  const ports = await choosePorts(process.env);
  const keys = keepDemoKeys(join(folder, 'demo-keys.json'));
  say('Starting the database, the object store, the identity provider and the mail catcher');
  const { services, mailPage } = await startStandIns(supervisor, folder, ports, keys);
  const settings = serverEnvironment(services, keys, {
    port: ports.web,
    keysFolder: join(folder, 'keys'),
  });
  // For commands beside the running demo, such as `npm run log:check`; it holds the demo's secrets.
  writeFileSync(join(folder, 'environment.json'), JSON.stringify(settings), { mode: 0o600 });
  const env = { ...process.env, ...settings };
  const { migrate } = await import('#server/db/migrate.ts');
  await migrate(services.databaseUrl);
  await seedOnce(supervisor, env);
  await build(root, say);
  say('Starting the server');
  await supervisor.startWeb(
    { name: 'The server', module: 'server/main.ts', logName: 'web', env },
    `${settings.PUBLIC_URL}/api/health`,
  );
  const { demoOwners } = await import('#seeds/demo-owners.ts');
  const dataFolder = relative(root, folder);
  console.log(startScreen({ url: settings.PUBLIC_URL, mailPage, owners: demoOwners, dataFolder }));
}

async function seedOnce(supervisor: Supervisor, env: Record<string, string | undefined>) {
  const mark = join(folder, 'seeded');
  if (existsSync(mark)) return;
  say('Loading the demo shop (first start only)');
  await supervisor.run({
    name: 'The demo shop',
    module: 'seeds/load.ts',
    logName: 'seed',
    env,
  });
  writeFileSync(mark, new Date().toISOString());
}

let leaving = false;

/** Stops all that was started, in order, and ends with `code`. Later calls change nothing. */
async function leave(supervisor: Supervisor, code: number): Promise<void> {
  if (leaving) return;
  leaving = true;
  await supervisor.stop();
  process.exit(code);
}

// One Ctrl-C arrives twice: from the terminal, and passed on by npm.
const sameSignal = 2_000;
let firstSignal = Infinity;

/** A first signal stops everything in order; a later one ends everything at once. */
function onSignal(supervisor: Supervisor): void {
  if (!leaving) {
    firstSignal = performance.now();
    void leave(supervisor, 0);
  } else if (performance.now() - firstSignal > sameSignal) {
    supervisor.kill();
    process.exit(1);
  }
}

try {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  holdStartLock(join(folder, 'start.pid'));
  const supervisor = new Supervisor(join(folder, 'logs'), (sentence) => {
    console.error(`${sentence} Everything is being stopped; run npm start again.`);
    void leave(supervisor, 1);
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const)
    process.on(signal, () => onSignal(supervisor));
  await start(supervisor).catch((error: unknown) => {
    // Whatever fails because everything is being stopped is not news.
    if (!leaving) console.error(sentenceFor(error));
    return leave(supervisor, 1);
  });
} catch (error) {
  console.error(sentenceFor(error));
  process.exitCode = 1;
}
