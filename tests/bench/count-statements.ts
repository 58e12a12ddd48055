import { run, select } from '#server/db/sql.ts';

/** Statements of the worker's own round, which goes on beside every request. */
const NOT_THE_PAGE = '%outbox%';

/**
 * How many SELECT, INSERT, UPDATE or DELETE statements the database got while `work` ran, by its
 * general log; those of the outbox are left out.
 */
export async function countStatements(work: () => Promise<unknown>): Promise<number> {
  await run("SET GLOBAL log_output = 'TABLE'");
  await run('TRUNCATE TABLE mysql.general_log');
  await run('SET GLOBAL general_log = 1');
  await work();
  await run('SET GLOBAL general_log = 0');
  const [row] = await select<{ count: string }>(
    `SELECT COUNT(*) AS count FROM mysql.general_log
     WHERE command_type IN ('Query', 'Execute') AND argument NOT LIKE ?
       AND argument REGEXP '^[[:space:]]*(SELECT|INSERT|UPDATE|DELETE)'`,
    [NOT_THE_PAGE],
  );
  return Number(row?.count);
}
