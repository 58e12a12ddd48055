import { createServer } from 'node:net';
import { expect, it } from 'vitest';
import { choosePorts } from './port-settings.ts';
import { freePort } from './ports.ts';

/** A variable for every port, so that what else runs on this machine does not matter. */
async function freeSettings() {
  const names = [
    'PORT',
    'MAIL_PAGE_PORT',
    'IDENTITY_PORT',
    'STORE_PORT',
    'SMTP_PORT',
    'DATABASE_PORT',
  ];
  const env: Record<string, string> = {};
  for (const name of names) {
    let port = await freePort();
    while (Object.values(env).includes(String(port))) port = await freePort();
    env[name] = String(port);
  }
  return env;
}

it('takes each port from its variable', async () => {
  const env = await freeSettings();
  expect(await choosePorts(env)).toEqual({
    web: Number(env.PORT),
    mailPage: Number(env.MAIL_PAGE_PORT),
    identity: Number(env.IDENTITY_PORT),
    store: Number(env.STORE_PORT),
    smtp: Number(env.SMTP_PORT),
    database: Number(env.DATABASE_PORT),
  });
});

it('names the port that is taken, who wanted it and how to choose another', async () => {
  const env = await freeSettings();
  const port = Number(env.PORT);
  const other = createServer();
  await new Promise<void>((resolve) => other.listen(port, '127.0.0.1', resolve));
  await expect(choosePorts(env)).rejects.toThrow(
    `Witnessmark needs port ${port}, which another program is using. Stop that program, or choose another port: PORT=${port + 10} npm start`,
  );
  other.close();
});

it.each(['web', '80', '3000.5', '70000'])('refuses the port "%s"', async (port) => {
  await expect(choosePorts({ ...(await freeSettings()), SMTP_PORT: port })).rejects.toThrow(
    'SMTP_PORT must be a port number from 1024 to 65535.',
  );
});

it('refuses one port for two', async () => {
  const env = await freeSettings();
  await expect(choosePorts({ ...env, STORE_PORT: env.PORT })).rejects.toThrow(
    `STORE_PORT and PORT are both ${env.PORT}. Choose two ports.`,
  );
});
