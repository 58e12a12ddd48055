import { exportJWK, generateKeyPair, SignJWT, type CryptoKey } from 'jose';
import { delay, http, HttpResponse } from 'msw';
import { setupServer } from 'msw/node';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import { env } from '../env.ts';

const ISSUER = 'http://identity.test';
const NOW = Math.floor(Date.now() / 1000);
const at = NOW - 600;

let key: CryptoKey;
let otherKey: CryptoKey;
let jwk: object;
const network = setupServer();

beforeAll(async () => {
  const pair = await generateKeyPair('ES256', { extractable: true });
  key = pair.privateKey;
  jwk = { ...(await exportJWK(pair.publicKey)), alg: 'ES256', use: 'sig' };
  otherKey = (await generateKeyPair('ES256')).privateKey;
  network.listen({ onUnhandledRequest: 'error' });
});
afterAll(() => network.close());

interface Claims {
  sub?: string;
  aud?: string;
  iss?: string;
  auth_time?: number;
}

function idToken(claims: Claims, signer = key, expires = NOW + 300): Promise<string> {
  const { aud = env().OAUTH_CLIENT_ID, iss = ISSUER, ...rest } = claims;
  return new SignJWT(rest)
    .setProtectedHeader({ alg: 'ES256' })
    .setIssuer(iss)
    .setAudience(aud)
    .setIssuedAt(NOW)
    .setExpirationTime(expires)
    .sign(signer);
}

const discovery = http.get(`${ISSUER}/.well-known/openid-configuration`, () =>
  HttpResponse.json({
    issuer: ISSUER,
    authorization_endpoint: `${ISSUER}/authorize`,
    token_endpoint: `${ISSUER}/token`,
    jwks_uri: `${ISSUER}/jwks`,
    code_challenge_methods_supported: ['S256'],
  }),
);
const token = (answer: () => Response | Promise<Response>) => http.post(`${ISSUER}/token`, answer);
const grants = (made: Promise<string>) =>
  token(async () =>
    HttpResponse.json({ access_token: 'a', token_type: 'Bearer', id_token: await made }),
  );

/** The module anew for each test: it keeps what it found out about the provider. */
let identifyStaff: (request: Request) => Promise<{ subject: string; at: Date }>;
beforeEach(async () => {
  vi.resetModules();
  env().OAUTH_ISSUER = ISSUER;
  process.env.OAUTH_ISSUER = ISSUER;
  ({ identifyStaff } = await import('./identify-staff.ts'));
  network.use(
    discovery,
    http.get(`${ISSUER}/jwks`, () => HttpResponse.json({ keys: [jwk] })),
  );
});
afterEach(() => {
  network.resetHandlers();
  vi.restoreAllMocks();
  vi.useRealTimers();
});

const thrown = <T>(work: Promise<T>) =>
  work.then(
    () => {
      throw new Error('nothing was thrown');
    },
    (error: unknown) => error as { code: string; sentence: string },
  );

async function begin(query = ''): Promise<{ url: URL; cookie: string }> {
  const answer = (await thrown(
    identifyStaff(new Request(`http://shop.test/sign-in/staff${query}`)),
  )) as unknown as Response;
  return {
    url: new URL(answer.headers.get('Location') ?? ''),
    cookie: (answer.headers.get('Set-Cookie') ?? '').split(';')[0] ?? '',
  };
}

async function comeBack(query: (state: string) => string) {
  const { url, cookie } = await begin();
  const state = url.searchParams.get('state') ?? '';
  const back = `http://shop.test/sign-in/callback?${query(state)}`;
  return identifyStaff(new Request(back, { headers: { Cookie: cookie } }));
}
const withCode = () => comeBack((state) => `code=c&state=${state}`);

const GONE = 'The shop’s sign-in service does not answer. Wait a minute and try again.';

describe('a sign-in at the identity provider', () => {
  it('begins with PKCE, a state, and the wish to know when they signed in', async () => {
    const { url, cookie } = await begin();
    expect(url.origin + url.pathname).toBe(`${ISSUER}/authorize`);
    const asked = Object.fromEntries(url.searchParams);
    expect(asked).toMatchObject({
      response_type: 'code',
      code_challenge_method: 'S256',
      scope: 'openid',
      max_age: '43200',
      redirect_uri: `${env().PUBLIC_URL}/sign-in/callback`,
    });
    expect(asked.code_challenge).toMatch(/^[\w-]{43}$/);
    expect(asked).not.toHaveProperty('prompt');
    expect(decodeURIComponent(cookie)).toContain(asked.state);
    expect((await begin('?fresh=1')).url.searchParams.get('prompt')).toBe('login');
  });

  it('ends with the subject the provider vouches for, and when they last signed in', async () => {
    network.use(grants(idToken({ sub: 'staff-ines-lund', auth_time: at })));
    expect(await withCode()).toEqual({ subject: 'staff-ines-lund', at: new Date(at * 1000) });
  });

  it.each([
    ['signed by somebody else', () => idToken({ sub: 's', auth_time: at }, otherKey)],
    ['for another program', () => idToken({ sub: 's', auth_time: at, aud: 'other' })],
    ['by another provider', () => idToken({ sub: 's', auth_time: at, iss: 'http://evil.test' })],
    ['without the time of the sign-in', () => idToken({ sub: 's' })],
    ['without a subject', () => idToken({ auth_time: at })],
  ])('is refused with an identity %s', async (_, made) => {
    network.use(grants(made()));
    expect((await thrown(withCode())).code).toBe('identity-unavailable');
  });

  it('is refused with an identity that has run out', async () => {
    network.use(grants(idToken({ sub: 's', auth_time: at }, key, NOW - 3600)));
    expect((await thrown(withCode())).sentence).toContain('too long ago');
  });

  it('must have been begun in this browser', async () => {
    const stranger = comeBack(() => 'code=c&state=somebody-elses');
    expect((await thrown(stranger)).sentence).toContain('begun in another browser');
    const bare = identifyStaff(new Request('http://shop.test/sign-in/callback?code=c&state=s'));
    expect((await thrown(bare)).sentence).toContain('begun in another browser');
  });

  it('is over when the code was used before', async () => {
    network.use(token(() => HttpResponse.json({ error: 'invalid_grant' }, { status: 400 })));
    expect((await thrown(withCode())).sentence).toBe(
      'This sign-in has been used already. Begin again.',
    );
  });

  it('is over when the person turns back', async () => {
    const turned = comeBack((state) => `error=access_denied&state=${state}`);
    expect((await thrown(turned)).sentence).toContain('You turned back');
  });
});

describe('an identity provider in trouble', () => {
  const AT_BEGIN: [string, () => Response | Promise<Response>][] = [
    ['is gone', () => HttpResponse.error()],
    ['refuses', () => HttpResponse.text('out of order', { status: 500 })],
    ['answers nonsense', () => HttpResponse.text('<h1>hello</h1>')],
    ['leaves things out', () => HttpResponse.json({ issuer: ISSUER })],
  ];

  it.each(AT_BEGIN)('that %s when a sign-in begins is said plainly', async (_, answer) => {
    network.use(http.get(`${ISSUER}/.well-known/openid-configuration`, answer));
    const problem = await thrown(identifyStaff(new Request('http://shop.test/sign-in/staff')));
    expect(problem).toMatchObject({ code: 'identity-unavailable', sentence: GONE });
  });

  it('that is slow is not waited for', async () => {
    const timeout = AbortSignal.timeout.bind(AbortSignal);
    vi.spyOn(AbortSignal, 'timeout').mockImplementation((ms) => {
      expect(ms).toBeLessThanOrEqual(6_000);
      return timeout(1);
    });
    network.use(
      http.get(`${ISSUER}/.well-known/openid-configuration`, async () => {
        await delay('infinite');
        return HttpResponse.error();
      }),
    );
    const problem = await thrown(identifyStaff(new Request('http://shop.test/sign-in/staff')));
    expect(problem.sentence).toBe(GONE);
  });

  it.each([
    ['is gone', () => HttpResponse.error()],
    ['refuses', () => new HttpResponse(null, { status: 500 })],
    ['does not know us', () => HttpResponse.json({ error: 'invalid_client' }, { status: 401 })],
  ] as [string, () => Response][])(
    'that %s when they come back is said plainly',
    async (_, answer) => {
      network.use(token(answer));
      expect((await thrown(withCode())).sentence).toBe(GONE);
    },
  );

  it('that is slow when they come back is not waited for', async () => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] });
    const asked = new Promise<void>((resolve) => {
      network.use(
        token(async () => {
          resolve();
          await new Promise(() => undefined);
          return HttpResponse.error();
        }),
      );
    });
    const problem = thrown(withCode());
    await asked;
    vi.advanceTimersByTime(12_000);
    expect((await problem).sentence).toBe(GONE);
  });

  it('that is there again is asked again', async () => {
    network.use(
      http.get(`${ISSUER}/.well-known/openid-configuration`, () => HttpResponse.error(), {
        once: true,
      }),
    );
    const first = identifyStaff(new Request('http://shop.test/sign-in/staff'));
    expect((await thrown(first)).code).toBe('identity-unavailable');
    expect((await begin()).url.origin).toBe(ISSUER);
  });
});
