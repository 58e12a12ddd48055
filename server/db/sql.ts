import { QueryTypes, Transaction } from 'sequelize';
import { database } from './connection.ts';
import { unlessGone } from './gone.ts';

export type { Transaction } from 'sequelize';

type Value = string | number | bigint | boolean | null | Date | Buffer;

/** Values for `?` in order, or for `:name` by name; an array fills `IN (?)`. */
export type Params =
  readonly (Value | readonly Value[])[] | Record<string, Value | readonly Value[]>;

/**
 * The statement with numbered or named binds. Binds, not replacements: values then stay out of the
 * SQL text, which ends up in error messages, and a Date keeps its milliseconds.
 */
function bound(sql: string, params: Params) {
  const bind = Array.isArray(params) ? params.map(listed) : mapValues(params, listed);
  let n = 0;
  const query = Array.isArray(params)
    ? sql.replace(/\?/g, () => `$${(n += 1)}`)
    : sql.replace(/(?<![:\w]):(?=[a-z])/gi, '$');
  return { query, bind: bind as Record<string, unknown> };
}

// IN () is no SQL; IN (NULL) matches nothing.
const listed = (value: unknown) => (Array.isArray(value) && value.length === 0 ? [null] : value);

const mapValues = (values: object, change: (value: unknown) => unknown) =>
  Object.fromEntries(Object.entries(values).map(([name, value]) => [name, change(value)]));

/**
 * Runs a SELECT (or an INSERT … RETURNING) and returns its rows as plain objects.
 * BIGINT and DECIMAL come as strings, UUID as a string, BINARY as a Buffer, DATETIME as a Date.
 */
export async function select<Row extends object>(
  sql: string,
  params: Params = [],
  tx?: Transaction,
): Promise<Row[]> {
  try {
    const { query, bind } = bound(sql, params);
    return await database().query<Row>(query, {
      type: QueryTypes.SELECT,
      bind,
      transaction: tx ?? null,
    });
  } catch (error) {
    throw unlessGone(error);
  }
}

/** Runs an INSERT, UPDATE or DELETE and returns how many rows it changed (not: how many it matched). */
export async function run(sql: string, params: Params = [], tx?: Transaction): Promise<number> {
  try {
    const { query, bind } = bound(sql, params);
    return await database().query(query, {
      type: QueryTypes.BULKUPDATE,
      bind,
      transaction: tx ?? null,
    });
  } catch (error) {
    throw unlessGone(error);
  }
}

const RETRIES = 4;

function isDeadlock(error: unknown): boolean {
  return (error as { parent?: { code?: string } }).parent?.code === 'ER_LOCK_DEADLOCK';
}

/**
 * Runs `work` in one transaction: committed when it returns, rolled back when it throws. A deadlock
 * is tried again from the start, so `work` may only touch the database.
 */
export async function transaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt += 1) {
    try {
      // READ COMMITTED: a row that was waited for is then read as it is now, and no gap is locked.
      const isolationLevel = Transaction.ISOLATION_LEVELS.READ_COMMITTED;
      return await database().transaction({ isolationLevel }, work);
    } catch (error) {
      if (attempt > RETRIES || !isDeadlock(error)) throw unlessGone(error);
    }
  }
}
