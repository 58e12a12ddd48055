import { NotAllowed } from './errors.ts';
import type { Role, Viewer } from './viewer.ts';

/**
 * How far a right reaches. `own`: only one's own (an entry one wrote, a case one is a party of).
 * `see` and `propose`: less than the verb itself, so `may` says no. `by link`: with a private link
 * from a mail, never by being signed in.
 */
export type Grant = 'yes' | 'own' | 'propose' | 'see' | 'by link' | 'no';

type Holder = Role | 'customer' | 'public';
type Row = Record<Holder, Grant>;

const row = (
  proprietor: Grant,
  technician: Grant,
  desk: Grant,
  customer: Grant = 'no',
  everyone: Grant = 'no',
): Row => ({ proprietor, technician, desk, customer, public: everyone });

/** Who may do what. The table people read is docs/rights.md; a test compares the two row by row. */
export const rights = {
  'see cases': row('yes', 'yes', 'yes', 'own'),
  'take in': row('yes', 'yes', 'yes'),
  'add entry': row('yes', 'yes', 'no'),
  'add photos and notes': row('yes', 'yes', 'yes'),
  seal: row('yes', 'yes', 'own'),
  amend: row('yes', 'yes', 'own'),
  'change visibility': row('yes', 'no', 'yes'),
  close: row('yes', 'yes', 'yes'),
  'hand back': row('yes', 'yes', 'yes'),
  'see estimate': row('yes', 'yes', 'yes', 'own'),
  'write estimate': row('yes', 'see', 'yes', 'see'),
  refund: row('yes', 'no', 'no'),
  'record authorisation': row('no', 'no', 'yes'),
  authorise: row('no', 'no', 'no', 'by link'),
  'issue warranty': row('yes', 'yes', 'yes'),
  'judge warranty': row('yes', 'no', 'propose'),
  'history link': row('yes', 'no', 'yes'),
  'export archive': row('yes', 'no', 'no'),
  'owner archive': row('no', 'no', 'no', 'own'),
  erase: row('yes', 'no', 'no'),
  'run the shop': row('yes', 'no', 'no'),
  verify: row('yes', 'yes', 'yes', 'yes', 'yes'),
} satisfies Record<string, Row>;

export type Verb = keyof typeof rights;

/** How far the viewer's right to `verb` reaches. */
export function grant(viewer: Viewer, verb: Verb): Grant {
  return rights[verb][viewer.kind === 'staff' ? viewer.role : viewer.kind];
}

/**
 * Whether the viewer may do `verb`. Where the right reaches only one's own, `facts.own` must be
 * true: either the row was looked at, or the query's WHERE carries the viewer's scope.
 */
export function may(viewer: Viewer, verb: Verb, facts: { own?: boolean } = {}): boolean {
  const reach = grant(viewer, verb);
  return reach === 'yes' || (reach === 'own' && facts.own === true);
}

/** Throws NotAllowed where `may` says no. */
export function demand(viewer: Viewer, verb: Verb, facts: { own?: boolean } = {}): void {
  if (!may(viewer, verb, facts)) throw new NotAllowed();
}
