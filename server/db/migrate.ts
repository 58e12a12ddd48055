import { pathToFileURL } from 'node:url';
import type { QueryInterface, Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { env } from '../env.ts';
import { connect } from './connection.ts';
import { migrations } from './migrations/all.ts';

const run = (context: QueryInterface, statements: string[]) =>
  statements.reduce<Promise<unknown>>(
    (before, sql) => before.then(() => context.sequelize.query(sql)),
    Promise.resolve(),
  );

/** The migrator on an open pool: `up()`, `down()`, `pending()`. */
export function migrator(sequelize: Sequelize) {
  return new Umzug<QueryInterface>({
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: ({ context }) => run(context, up),
      down: ({ context }) => run(context, down),
    })),
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize, tableName: 'migrations' }),
    logger: undefined,
  });
}

/**
 * Brings the database at `url` (by default `DATABASE_URL`) to the newest schema.
 * Returns the names of the migrations it ran.
 */
export async function migrate(url = env().DATABASE_URL): Promise<string[]> {
  const sequelize = connect(url);
  try {
    return (await migrator(sequelize).up()).map(({ name }) => name);
  } finally {
    await sequelize.close();
  }
}

// As a command: node --import tsx server/db/migrate.ts
if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) await migrate();
