import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { makeDemoKeys } from '#local/demo-keys.ts';
import type { DemoKeys } from '#local/demo-keys.ts';
import { startMail } from '#local/mail.ts';
import { startDatabaseProgram, startStoreProgram } from '#local/stand-ins.ts';
import { Supervisor } from '#local/supervisor.ts';

/** What the tests of one run share; databases, buckets and addresses in it are each file's own. */
export interface TestServices {
  databaseUrl: string;
  storeEndpoint: string;
  smtpUrl: string;
  mailUrl: string;
  keys: DemoKeys;
  folder: string;
}

declare module 'vitest' {
  interface ProvidedContext {
    services: TestServices;
  }
}

/** Starts MariaDB, the object store and a mail catcher for one run of the tests, in a folder of its own. */
export default async function startServices(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), 'witnessmark-tests-'));
  const keys = makeDemoKeys();
  const supervisor = new Supervisor(join(folder, 'logs'), (sentence) => console.error(sentence));
  const stop = async () => {
    await supervisor.stop();
    await rm(folder, { recursive: true, force: true });
  };
  try {
    const [database, store, mail] = await Promise.all([
      startDatabaseProgram(supervisor, {
        directory: join(folder, 'mariadb'),
        port: 0,
        user: 'test',
        password: keys.databasePassword,
        name: 'test',
        throwaway: true,
      }),
      startStoreProgram(supervisor, {
        directory: join(folder, 'store'),
        port: 0,
        accessKeyId: keys.storeKeyId,
        secretAccessKey: keys.storeSecret,
        bucket: 'test-shared',
      }),
      startMail({ directory: join(folder, 'mail'), smtpPort: 0, pagePort: 0 }),
    ]);
    project.provide('services', {
      databaseUrl: database.url,
      storeEndpoint: store.endpoint,
      smtpUrl: mail.smtpUrl,
      mailUrl: mail.pageUrl,
      keys,
      folder,
    });
    return async () => {
      await mail.stop();
      await stop();
    };
  } catch (error) {
    await stop();
    throw error;
  }
}
