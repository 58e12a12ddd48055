import { existsSync } from 'node:fs';
import { mkdtemp } from 'node:fs/promises';
import { join } from 'node:path';
import { afterAll, inject } from 'vitest';
import { startIdentity } from '#local/identity.ts';
import type { Identity } from '#local/identity.ts';
import { startMail } from '#local/mail.ts';
import type { Mail } from '#local/mail.ts';
import { freePort } from '#local/ports.ts';
import { callbackPath, clientId } from '#local/server-environment.ts';
import { startStoreProgram } from '#local/stand-ins.ts';
import { Supervisor } from '#local/supervisor.ts';
import { createDatabase, dropDatabase } from './database.ts';
import { freshEnvironment } from './fresh-names.ts';
import { createBucket } from './store.ts';

/** The built program as it runs for people, with everything it talks to. */
export interface App {
  /** Where it is served, without a slash. */
  url: string;
  /** Its environment, for code of the test that looks into its database or store. */
  env: Record<string, string>;
  /** Its own mail catcher and identity provider; `fault` makes them slow, refusing or gone. */
  mail: Mail;
  identity: Identity;
  /** The origin to `setFault` for its object store; only with `ownStore` is the store its own. */
  storeUrl: string;
  /** Ends the server at once, as a crash would, and starts it again. */
  crashAndRestart: () => Promise<void>;
}

export interface AppOptions {
  /** Loads the demo shop before the server starts. */
  seeded?: boolean;
  /** Starts an object store for this one alone, so that its faults touch nobody else. */
  ownStore?: boolean;
}

/**
 * Starts the built program for one test file and stops it after the file's last test. Call it at the top level:
 * `const app = await startApp();`. Needs a build; throws a sentence when there is none.
 */
export async function startApp({
  seeded = false,
  ownStore = false,
}: AppOptions = {}): Promise<App> {
  const undo: (() => Promise<unknown>)[] = [];
  afterAll(async () => {
    for (const step of undo.reverse()) await step();
  });
  if (!existsSync('build/server/index.js'))
    throw new Error('There is no build to test. Run: npx react-router build');
  const shared = inject('services');
  const folder = await mkdtemp(join(shared.folder, 'app-'));
  const port = await freePort();
  const mail = await startMail({ directory: join(folder, 'mail'), smtpPort: 0, pagePort: 0 });
  undo.push(mail.stop);
  const identity = await startIdentity({
    port: 0,
    clientId,
    clientSecret: shared.keys.clientSecret,
    redirectUris: [`http://127.0.0.1:${port}${callbackPath}`],
  });
  undo.push(identity.stop);
  let supervisor = new Supervisor(join(folder, 'logs'));
  undo.push(() => supervisor.stop());
  const stores = new Supervisor(join(folder, 'logs'));
  undo.push(() => stores.stop());
  const storeEndpoint = ownStore
    ? (await startOwnStore(stores, folder, shared.keys)).endpoint
    : shared.storeEndpoint;
  const env = {
    ...freshEnvironment(
      { ...shared, storeEndpoint },
      { port, issuer: identity.issuer, smtpUrl: mail.smtpUrl },
    ),
    LOG_LEVEL: 'info',
  };
  undo.push(() => dropDatabase(env.DATABASE_URL));
  await createDatabase(env.DATABASE_URL);
  await createBucket(env);
  const inherited = { PATH: process.env.PATH, HOME: process.env.HOME, ...env };
  if (seeded)
    await supervisor.run({
      name: 'The demo shop',
      module: 'seeds/load.ts',
      logName: 'seed',
      env: inherited,
    });
  const serve = () =>
    supervisor.startWeb(
      { name: 'The server', module: 'server/main.ts', logName: 'web', env: inherited },
      `${env.PUBLIC_URL}/api/health`,
    );
  await serve();
  return {
    url: env.PUBLIC_URL,
    env,
    mail,
    identity,
    storeUrl: storeEndpoint,
    crashAndRestart: async () => {
      supervisor.kill();
      await supervisor.stop();
      supervisor = new Supervisor(join(folder, 'logs'));
      await serve();
    },
  };
}

function startOwnStore(
  supervisor: Supervisor,
  folder: string,
  keys: { storeKeyId: string; storeSecret: string },
) {
  return startStoreProgram(supervisor, {
    directory: join(folder, 'store'),
    port: 0,
    accessKeyId: keys.storeKeyId,
    secretAccessKey: keys.storeSecret,
    bucket: 'own',
  });
}
