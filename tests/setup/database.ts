import { createConnection } from 'mariadb';
import { afterAll, beforeAll } from 'vitest';
import { closeDatabase } from '#server/db/connection.ts';
import { migrate } from '#server/db/migrate.ts';

/** Makes the database that this URL names and brings it to the newest schema. */
export async function createDatabase(url: string): Promise<void> {
  await onServer(url, (name) => `CREATE DATABASE \`${name}\``);
  await migrate(url);
}

/** Drops the database that this URL names. */
export async function dropDatabase(url: string): Promise<void> {
  await onServer(url, (name) => `DROP DATABASE IF EXISTS \`${name}\``);
}

/** Gives this test file its own migrated database, the one `DATABASE_URL` names, and drops it afterwards. */
export function useDatabase(): void {
  const url = () => String(process.env.DATABASE_URL);
  beforeAll(() => createDatabase(url()));
  afterAll(async () => {
    await closeDatabase();
    await dropDatabase(url());
  });
}

async function onServer(url: string, statement: (database: string) => string): Promise<void> {
  const { hostname, port, username, password, pathname } = new URL(url);
  const connection = await createConnection({
    host: hostname,
    port: Number(port),
    user: username,
    password: decodeURIComponent(password),
  });
  await connection.query(statement(pathname.slice(1)));
  await connection.end();
}
