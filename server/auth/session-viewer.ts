import { PUBLIC, type Role, type Viewer } from '#domain/viewer.ts';
import { run, select } from '../db/sql.ts';
import { hashToken } from './token.ts';
import { sessionCookie } from './cookies.ts';
import { STAFF_IDLE_MS } from './session-length.ts';

interface Row {
  person_id: string | null;
  role: Role;
  number: number;
  person_name: string;
  customer_id: string | null;
  customer_name: string;
  fresh_at: Date;
  seen_at: Date;
}

/** How old `seen_at` may be before it is written again: not every page view needs a write. */
const SEEN_EVERY_MS = 5 * 60 * 1000;

const FIND = `
  SELECT s.person_id, p.role, p.number, p.name AS person_name,
         s.customer_id, c.name AS customer_name, s.fresh_at, s.seen_at
  FROM sessions s
  LEFT JOIN people p ON p.id = s.person_id AND p.removed_at IS NULL
  LEFT JOIN customers c ON c.id = s.customer_id AND c.erased_at IS NULL
  WHERE s.id_hash = :hash AND s.expires_at > :now
    AND (p.id IS NOT NULL OR c.id IS NOT NULL)`;

/**
 * Who the request's cookie stands for: one query, and none without a cookie. A session that ended,
 * was revoked or whose person was removed stands for nobody.
 */
export async function sessionViewer(request: Request, { now = new Date() } = {}): Promise<Viewer> {
  const id: unknown = await sessionCookie().parse(request.headers.get('Cookie'));
  if (typeof id !== 'string') return PUBLIC;
  const hash = hashToken(id);
  const [row] = await select<Row>(FIND, { hash, now });
  if (row === undefined) return PUBLIC;
  if (row.person_id === null) {
    return { kind: 'customer', customerId: row.customer_id ?? '', name: row.customer_name };
  }
  if (now.getTime() - row.seen_at.getTime() > SEEN_EVERY_MS) await keepAlive(hash, now);
  const { person_id: personId, person_name: name, role, number, fresh_at: freshAt } = row;
  return { kind: 'staff', personId, role, name, number, freshAt };
}

// Only staff sessions end by idleness; a customer's ends on its day.
async function keepAlive(hash: Buffer, now: Date): Promise<void> {
  const until = new Date(now.getTime() + STAFF_IDLE_MS);
  await run('UPDATE sessions SET seen_at = ?, expires_at = ? WHERE id_hash = ?', [
    now,
    until,
    hash,
  ]);
}
