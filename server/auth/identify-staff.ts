import { errors as joseErrors } from 'jose';
import { Authenticator } from 'remix-auth';
import { OAuth2RequestError } from 'remix-auth-oauth2';
import { Invalid, Unavailable, type Problem } from '#domain/errors.ts';
import { log } from '../log.ts';
import { PATIENCE_MS, staffStrategy, type Identity } from './identity-provider.ts';

const LATE = 'This sign-in was begun in another browser, or too long ago. Begin again.';
const USED = 'This sign-in has been used already. Begin again.';
const TURNED_BACK =
  'You turned back at the shop’s sign-in service. Begin again when you are ready.';

const said = (sentence: string) => new Invalid({}, sentence);

// The provider's own errors about this one sign-in (RFC 6749, 4.1.2.1 and 5.2); the rest are its
// trouble or ours, and nothing the person can mend.
function problemOf(error: unknown): Problem {
  if (error instanceof OAuth2RequestError) {
    if (error.code === 'access_denied') return said(TURNED_BACK);
    if (error.code === 'invalid_grant') return said(USED);
  }
  if (isStateUnknown(error)) return said(LATE);
  if (error instanceof joseErrors.JWTExpired) return said(LATE);
  log.warn({ err: error }, 'the identity provider was of no use');
  return new Unavailable('identity');
}

// The strategy throws these, with these words, for a state it does not know or a missing code.
function isStateUnknown(error: unknown): boolean {
  const known = error instanceof ReferenceError || error instanceof RangeError;
  return known && /\b(?:state|cookie|code)\b/i.test(error.message);
}

async function patiently<T>(work: Promise<T>): Promise<T> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error('the identity provider is slow')), 2 * PATIENCE_MS);
  });
  return Promise.race([work, late]).finally(() => clearTimeout(timer));
}

async function authenticate(request: Request): Promise<Identity> {
  const authenticator = new Authenticator<Identity>();
  authenticator.use(await staffStrategy(), 'staff');
  return authenticator.authenticate('staff', request);
}

/**
 * Begins a sign-in at the identity provider (throws the redirect to it), or, with its answer in the
 * request, returns whom it vouches for. Throws Invalid when the sign-in must be begun again, and
 * Unavailable when the provider is slow, refuses or is gone.
 */
export async function identifyStaff(request: Request): Promise<Identity> {
  try {
    return await patiently(authenticate(request));
  } catch (error) {
    if (error instanceof Response) throw error;
    throw problemOf(error);
  }
}
