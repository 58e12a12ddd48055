import { createCookie, type Cookie } from 'react-router';
import { env } from '../env.ts';

const DAY = 24 * 60 * 60;

const held = new Map<string, Cookie>();

function cookie(name: string, maxAge: number, path: string): Cookie {
  const known = held.get(name);
  if (known !== undefined) return known;
  const { PUBLIC_URL, SESSION_SECRET } = env();
  const secure = PUBLIC_URL.startsWith('https:');
  // The prefixes make a browser refuse the cookie from a plain-http or sibling page.
  const prefix = secure ? (path === '/' ? '__Host-' : '__Secure-') : '';
  const made = createCookie(prefix + name, {
    httpOnly: true,
    maxAge,
    path,
    sameSite: 'lax',
    secure,
    secrets: [SESSION_SECRET],
  });
  held.set(name, made);
  return made;
}

/** Holds the session's id. The database, not this age, says when a session ends. */
export const sessionCookie = () => cookie('witnessmark-session', 30 * DAY, '/');

/** Binds a sign-in code to the browser that asked for it. */
export const codeCookie = () => cookie('witnessmark-code', 60 * 60, '/sign-in');

/** Where to go after the identity provider has sent the person back. */
export const returnCookie = () => cookie('witnessmark-return', 10 * 60, '/sign-in');
