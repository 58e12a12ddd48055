import { run } from '../db/sql.ts';
import { sessionCookie } from './cookies.ts';
import { hashToken } from './token.ts';

/** Ends the request's session, if it has one. Returns the Set-Cookie value that empties the cookie. */
export async function endSession(request: Request): Promise<string> {
  const cookie = sessionCookie();
  const id: unknown = await cookie.parse(request.headers.get('Cookie'));
  if (typeof id === 'string') await run('DELETE FROM sessions WHERE id_hash = ?', [hashToken(id)]);
  return cookie.serialize('', { maxAge: 0 });
}
