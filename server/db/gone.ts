import { BaseError, ConnectionError } from 'sequelize';
import { Unavailable } from '#domain/errors.ts';

// Codes of the mariadb connector for a connection that broke while a statement ran.
const BROKEN = /^(ER_SOCKET|ER_CONNECTION|ER_CMD_CONNECTION|ER_POOL|ECONN|EPIPE|ETIMEDOUT|ESOCKET)/;

/** True when `error` says that the database cannot be reached, not that a statement was wrong. */
export function isDatabaseGone(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  if (!(error instanceof BaseError) || !('parent' in error)) return false;
  const { code } = error.parent as { code?: string };
  return BROKEN.test(code ?? '') || code === 'ER_SERVER_SHUTDOWN';
}

/** `error` itself, or the sentence for people when the database cannot be reached. */
export function unlessGone(error: unknown): unknown {
  return isDatabaseGone(error) ? new Unavailable('database') : error;
}
