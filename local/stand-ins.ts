import { join } from 'node:path';
import type { Database, DatabaseOptions } from './database.ts';
import type { DemoKeys } from './demo-keys.ts';
import type { Identity, IdentityOptions } from './identity.ts';
import type { Mail, MailOptions } from './mail.ts';
import { callbackPath, clientId } from './server-environment.ts';
import type { Store, StoreOptions } from './store.ts';
import type { Supervisor } from './supervisor.ts';

/** The ports of one installation; 0 chooses a free one for a stand-in. */
export interface Ports {
  web: number;
  mailPage: number;
  identity: number;
  store: number;
  smtp: number;
  database: number;
}

/** Starts MariaDB under a supervisor. */
export function startDatabaseProgram(supervisor: Supervisor, options: DatabaseOptions) {
  const program = { name: 'The database', module: 'local/database.ts', logName: 'database' };
  return supervisor.startStandIn<Omit<Database, 'stop'>>(program, options);
}

/** Starts the object store under a supervisor. */
export function startStoreProgram(supervisor: Supervisor, options: StoreOptions) {
  return supervisor.startStandIn<Omit<Store, 'stop'>>(
    {
      name: 'The object store',
      module: 'local/store.ts',
      logName: 'store',
      // s3rver writes its continuation tokens with DES, which OpenSSL 3 keeps in its legacy provider.
      nodeFlags: ['--openssl-legacy-provider'],
    },
    options,
  );
}

/** Starts the identity provider under a supervisor. */
export function startIdentityProgram(supervisor: Supervisor, options: IdentityOptions) {
  const program = {
    name: 'The identity provider',
    module: 'local/identity.ts',
    logName: 'identity',
  };
  return supervisor.startStandIn<Pick<Identity, 'issuer'>>(program, options);
}

/** Starts the mail catcher under a supervisor. */
export function startMailProgram(supervisor: Supervisor, options: MailOptions) {
  const program = { name: 'The mail catcher', module: 'local/mail.ts', logName: 'mail' };
  return supervisor.startStandIn<Pick<Mail, 'smtpUrl' | 'pageUrl'>>(program, options);
}

/** Starts all of them for one installation with its data in `folder`, the database first. */
export async function startStandIns(
  supervisor: Supervisor,
  folder: string,
  ports: Ports,
  keys: DemoKeys,
) {
  const bucket = 'photos';
  // Launched one after the other, awaited together: none needs another.
  const [database, store, identity, mail] = await Promise.all([
    startDatabaseProgram(supervisor, {
      directory: join(folder, 'mariadb'),
      port: ports.database,
      user: 'witnessmark',
      password: keys.databasePassword,
      name: 'witnessmark',
    }),
    startStoreProgram(supervisor, {
      directory: join(folder, 'store'),
      port: ports.store,
      accessKeyId: keys.storeKeyId,
      secretAccessKey: keys.storeSecret,
      bucket,
    }),
    startIdentityProgram(supervisor, {
      port: ports.identity,
      clientId,
      clientSecret: keys.clientSecret,
      redirectUris: [`http://127.0.0.1:${ports.web}${callbackPath}`],
    }),
    startMailProgram(supervisor, {
      directory: join(folder, 'mail'),
      smtpPort: ports.smtp,
      pagePort: ports.mailPage,
    }),
  ]);
  return {
    mailPage: mail.pageUrl,
    services: {
      databaseUrl: database.url,
      storeEndpoint: store.endpoint,
      bucket,
      smtpUrl: mail.smtpUrl,
      issuer: identity.issuer,
    },
  };
}
