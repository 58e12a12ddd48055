import { may, type Verb } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';

/** Who may come to a route at all. */
type Door = 'everyone' | 'signed in' | 'staff' | 'customers';

/** `anyone`: whoever the door lets in. A verb: whoever it lets in and has that right. */
type Right = Verb | 'anyone';

/** Without `read` or `write` a route answers no GET, or no change, to anyone. */
export interface Access {
  door: Door;
  read?: Right;
  write?: Right;
}

const bench = (read: Verb, write?: Verb): Access =>
  write === undefined ? { door: 'staff', read } : { door: 'staff', read, write };
const portal: Access = { door: 'customers', read: 'see cases' };
const open: Access = { door: 'everyone', read: 'verify' };

/**
 * Who may come where: one row per route pattern, and a route without a row answers nobody. The verb
 * is the least that any act of the route needs; each operation asks for its own. Whose record it is
 * is not decided here but in the WHERE of every query.
 */
export const access: Record<string, Access> = {
  '/': { door: 'everyone', read: 'anyone' },
  '/sign-in': { door: 'everyone', read: 'anyone', write: 'anyone' },
  '/sign-in/code': { door: 'everyone', read: 'anyone', write: 'anyone' },
  '/sign-in/staff': { door: 'everyone', read: 'anyone' },
  '/sign-in/callback': { door: 'everyone', read: 'anyone' },
  '/sign-out': { door: 'everyone', read: 'anyone', write: 'anyone' },

  '/bench': bench('see cases'),
  '/bench/find': bench('see cases'),
  '/bench/take-in': bench('take in', 'take in'),
  '/bench/cases/:number': bench('see cases', 'see cases'),
  '/bench/cases/:number/add': bench('add photos and notes', 'add photos and notes'),
  '/bench/cases/:number/entries/:entry': bench('add photos and notes', 'add photos and notes'),
  '/bench/cases/:number/close': bench('close', 'close'),
  '/bench/cases/:number/warranty': bench('see cases', 'issue warranty'),
  '/bench/warranties': bench('see cases'),

  '/portal': portal,
  '/portal/cases/:number': portal,
  '/portal/cases/:number/timeline': portal,
  '/portal/cases/:number/warranty': portal,

  '/verify': open,
  '/verify/:code': open,
  '/verify/what-is-checked': open,
  '/log': open,
  '/t/:code': open,

  '/api/health': { door: 'everyone', read: 'anyone' },
  '/api/changes': { door: 'signed in', read: 'see cases' },
  '/api/cases/:number/photos/:photoId': { door: 'staff', write: 'add photos and notes' },
  '/api/media/:photoId/:size': { door: 'signed in', read: 'see cases' },
  '/api/papers/:paperId': { door: 'signed in', read: 'see cases' },
  '/api/verify/:code': open,
  '/api/log/checkpoint': open,
  '/api/log/entries': open,
  '/api/log/keys': open,
};

export type Decision = 'go' | 'sign in' | 'forbidden' | 'no such method' | 'no such route';

function opens(door: Door, viewer: Viewer): boolean {
  if (door === 'everyone') return true;
  if (door === 'signed in') return viewer.kind !== 'public';
  return viewer.kind === (door === 'staff' ? 'staff' : 'customer');
}

/** What the table says to `viewer` who asks `pattern` with `method`. HEAD is a GET. */
export function decide(pattern: string, method: string, viewer: Viewer): Decision {
  const row = Object.hasOwn(access, pattern) ? access[pattern] : undefined;
  if (row === undefined) return 'no such route';
  if (row.door !== 'everyone' && viewer.kind === 'public') return 'sign in';
  if (!opens(row.door, viewer)) return 'forbidden';
  const right = method === 'GET' || method === 'HEAD' ? row.read : row.write;
  if (right === undefined) return 'no such method';
  // Whether it is one's own is the query's matter; here it is enough that one's own may be reached.
  return right === 'anyone' || may(viewer, right, { own: true }) ? 'go' : 'forbidden';
}
