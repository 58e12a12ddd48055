import { mkdtemp, rm, stat } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, it } from 'vitest';
import { keepDemoKeys, makeDemoKeys } from './demo-keys.ts';
import { serverEnvironment } from './server-environment.ts';
import { parseEnv } from '#server/env.ts';

it('makes keys once, for their owner alone to read', async () => {
  const folder = await mkdtemp(join(tmpdir(), 'witnessmark-keys-'));
  const path = join(folder, 'demo-keys.json');
  const keys = keepDemoKeys(path);
  expect(keepDemoKeys(path)).toEqual(keys);
  expect((await stat(path)).mode & 0o777).toBe(0o600);
  await rm(folder, { recursive: true });
});

it('makes other keys for another installation', () => {
  const [one, two] = [Object.values(makeDemoKeys()), Object.values(makeDemoKeys())];
  expect(new Set([...one, ...two]).size).toBe(one.length + two.length);
});

it('makes an environment that the server accepts as a demo', () => {
  const services = {
    databaseUrl: 'mariadb://a:b@127.0.0.1:3005/witnessmark',
    storeEndpoint: 'http://127.0.0.1:3003',
    bucket: 'photos',
    smtpUrl: 'smtp://127.0.0.1:3004',
    issuer: 'http://127.0.0.1:3002',
  };
  const environment = serverEnvironment(services, makeDemoKeys(), {
    port: 3000,
    keysFolder: '/tmp/keys',
  });
  expect(parseEnv(environment)).toMatchObject({ DEMO: true, PUBLIC_URL: 'http://127.0.0.1:3000' });
});
