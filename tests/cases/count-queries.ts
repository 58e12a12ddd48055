import { database } from '#server/db/connection.ts';

/** Sequelize reads this at every statement, but its types name it in the constructor alone. */
interface Options {
  logging: false | ((sql: string) => void);
}

/** Runs `work` and counts the statements it sends to the database, transaction marks left out. */
export async function countQueries<T>(
  work: () => Promise<T>,
): Promise<{ count: number; value: T }> {
  const { options } = database() as unknown as { options: Options };
  const before = options.logging;
  let count = 0;
  options.logging = (sql) => {
    if (/\b(SELECT|INSERT|UPDATE|DELETE)\b/.test(sql)) count += 1;
  };
  try {
    return { value: await work(), count };
  } finally {
    options.logging = before;
  }
}
