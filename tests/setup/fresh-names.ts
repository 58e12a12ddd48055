import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { serverEnvironment } from '#local/server-environment.ts';
import type { TestServices } from './services.ts';

/** The server's environment with a database, a bucket and a key folder that nobody else uses; none is made yet. */
export function freshEnvironment(
  services: TestServices,
  others: { port: number; issuer: string; smtpUrl: string },
) {
  const name = randomBytes(6).toString('hex');
  const database = new URL(services.databaseUrl);
  database.pathname = `/test_${name}`;
  return serverEnvironment(
    {
      databaseUrl: database.href,
      storeEndpoint: services.storeEndpoint,
      bucket: `test-${name}`,
      smtpUrl: others.smtpUrl,
      issuer: others.issuer,
    },
    services.keys,
    { port: others.port, keysFolder: join(services.folder, `keys-${name}`) },
  );
}
