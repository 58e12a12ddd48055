import { createHash } from 'node:crypto';
import { RateLimiterRes } from 'rate-limiter-flexible';
import RateLimiterStoreAbstract from 'rate-limiter-flexible/lib/RateLimiterStoreAbstract.js';
import { run, select } from '../db/sql.ts';

interface Count {
  points: number;
  expires_at: Date;
}

const UPSERT = `
  INSERT INTO rate_counts (id_hash, points, expires_at) VALUES (:id, :points, :until)
  ON DUPLICATE KEY UPDATE
    points = IF(expires_at <= :now OR :anew, VALUES(points), points + VALUES(points)),
    expires_at = IF(expires_at <= :now OR :anew, VALUES(expires_at), expires_at)
  RETURNING points, expires_at`;

// Hashed, so that the table does not say who asked.
const idOf = (key: string) => createHash('sha256').update(key).digest();

/**
 * rate-limiter-flexible on the shop's own database: counts outlive a restart and hold for every
 * process. The underscored methods are what the library asks of a store.
 */
export class DatabaseLimiter extends RateLimiterStoreAbstract {
  constructor(options: { keyPrefix: string; points: number; duration: number }) {
    super({ ...options, storeClient: null });
  }

  async _upsert(key: string, points: number, ms: number, anew = false): Promise<Count[]> {
    const now = new Date();
    const until = new Date(now.getTime() + ms);
    return select<Count>(UPSERT, { id: idOf(key), points, now, until, anew });
  }

  async _get(key: string): Promise<Count[] | null> {
    const sql = 'SELECT points, expires_at FROM rate_counts WHERE id_hash = ? AND expires_at > ?';
    const rows = await select<Count>(sql, [idOf(key), new Date()]);
    return rows.length > 0 ? rows : null;
  }

  async _delete(key: string): Promise<boolean> {
    return (await run('DELETE FROM rate_counts WHERE id_hash = ?', [idOf(key)])) > 0;
  }

  _getRateLimiterRes(_key: string, changed: number, [row]: Count[]): RateLimiterRes {
    const consumed = row?.points ?? changed;
    const msBeforeNext = Math.max((row?.expires_at.getTime() ?? 0) - Date.now(), 0);
    const left = Math.max(this.points - consumed, 0);
    return new RateLimiterRes(left, msBeforeNext, consumed, consumed === changed);
  }
}
