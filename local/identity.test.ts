import { createHash, randomBytes } from 'node:crypto';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { startIdentity } from './identity.ts';
import type { Identity } from './identity.ts';

const redirectUri = 'http://127.0.0.1:9/sign-in/callback';
const client = { clientId: 'shop', clientSecret: 'client secret' };
const silence = ['warn', 'info', 'error'] as const;
const said = silence.map((name) => vi.spyOn(console, name));
let identity: Identity;

beforeAll(async () => {
  identity = await startIdentity({ port: 0, ...client, redirectUris: [redirectUri] });
});

afterAll(() => identity.stop());

/** A browser that keeps cookies and follows redirects on the provider's own address only. */
class Visitor {
  private cookies = new Map<string, string>();

  async open(address: string, form?: Record<string, string>): Promise<Response> {
    const response = await fetch(address, {
      redirect: 'manual',
      headers: { cookie: [...this.cookies].map((pair) => pair.join('=')).join('; ') },
      ...(form && { method: 'POST', body: new URLSearchParams(form) }),
    });
    for (const cookie of response.headers.getSetCookie()) {
      const [name = '', value = ''] = (cookie.split(';')[0] ?? '').split('=');
      if (value) this.cookies.set(name, value);
      else this.cookies.delete(name);
    }
    const next = response.headers.get('location');
    if (!next) return response;
    const target = new URL(next, address);
    return target.origin === identity.issuer ? this.open(target.href) : response;
  }

  cookieNames = () => [...this.cookies.keys()];
}

const verifier = randomBytes(32).toString('base64url');

function authorisation(changes: Record<string, string | undefined> = {}): string {
  const query = {
    client_id: client.clientId,
    redirect_uri: redirectUri,
    response_type: 'code',
    scope: 'openid profile email',
    state: 'state-1',
    code_challenge: createHash('sha256').update(verifier).digest('base64url'),
    code_challenge_method: 'S256',
    ...changes,
  };
  const given = Object.entries(query).filter(([, value]) => value !== undefined);
  return `${identity.issuer}/auth?${new URLSearchParams(given)}`;
}

const location = (response: Response) => new URL(response.headers.get('location') ?? '');

/** Signs in as this person and gives the code that the shop would get. */
async function codeFor(person: string, visitor = new Visitor()): Promise<string> {
  const page = await visitor.open(authorisation());
  const back = location(await visitor.open(page.url, { person }));
  expect(back.searchParams.get('state')).toBe('state-1');
  return back.searchParams.get('code') ?? '';
}

const exchange = (code: string, changes: { secret?: string; verifier?: string } = {}) =>
  fetch(`${identity.issuer}/token`, {
    method: 'POST',
    headers: {
      authorization: `Basic ${btoa(`shop:${encodeURIComponent(changes.secret ?? client.clientSecret)}`)}`,
    },
    body: new URLSearchParams({
      grant_type: 'authorization_code',
      code,
      redirect_uri: redirectUri,
      code_verifier: changes.verifier ?? verifier,
    }),
  });

it('signs a chosen person in and tells the shop who it is', async () => {
  const token = (await (await exchange(await codeFor('staff-tomasz-rell'))).json()) as {
    access_token: string;
  };
  const userinfo = await fetch(`${identity.issuer}/me`, {
    headers: { authorization: `Bearer ${token.access_token}` },
  });
  expect(await userinfo.json()).toEqual({
    sub: 'staff-tomasz-rell',
    name: 'Tomasz Rell',
    email: 'tomasz@witnessmark.example',
    email_verified: true,
  });
});

it('describes itself where a client looks for it', async () => {
  const found = await fetch(`${identity.issuer}/.well-known/openid-configuration`);
  expect(await found.json()).toMatchObject({
    issuer: identity.issuer,
    code_challenge_methods_supported: ['S256'],
  });
});

it('lists the demo staff and what they do', async () => {
  const page = await (await new Visitor().open(authorisation())).text();
  for (const words of [
    'Ines Lund, shop owner',
    'Tomasz Rell, technician',
    'Priya Damm, front desk',
  ])
    expect(page).toContain(words);
  expect(page).toContain('Turn back');
});

it('asks again at the next sign-in of the same browser, and lets another person in', async () => {
  const visitor = new Visitor();
  await codeFor('staff-ines-lund', visitor);
  const page = await (await visitor.open(authorisation())).text();
  expect(page).toContain('Who is signing in?');
  const code = await codeFor('staff-priya-damm', visitor);
  const { id_token } = (await (await exchange(code)).json()) as { id_token: string };
  const claims = JSON.parse(
    atob((id_token.split('.')[1] ?? '').replace(/-/g, '+').replace(/_/g, '/')),
  );
  expect(claims).toMatchObject({ sub: 'staff-priya-damm', aud: 'shop' });
});

it.each(['', 'staff-nobody'])('sends access_denied back for the choice "%s"', async (person) => {
  const visitor = new Visitor();
  const page = await visitor.open(authorisation());
  const back = location(await visitor.open(page.url, { person }));
  expect(back.searchParams.get('error')).toBe('access_denied');
  expect(back.searchParams.get('state')).toBe('state-1');
});

it.each([
  ['no challenge', { code_challenge: undefined, code_challenge_method: undefined }],
  ['a plain challenge', { code_challenge: verifier, code_challenge_method: 'plain' }],
])('refuses a sign-in with %s', async (_what, changes) => {
  const back = location(await new Visitor().open(authorisation(changes)));
  expect(back.searchParams.get('error')).toBe('invalid_request');
});

it('refuses an address to return to that it was not told of', async () => {
  const other = authorisation({ redirect_uri: 'http://127.0.0.1:9/elsewhere' });
  const answer = await new Visitor().open(other);
  expect(answer.status).toBe(400);
});

it('gives no token for a wrong secret, a wrong verifier or a code used before', async () => {
  expect((await exchange(await codeFor('staff-ines-lund'), { secret: 'guess' })).status).toBe(401);
  const other = randomBytes(32).toString('base64url');
  expect((await exchange(await codeFor('staff-ines-lund'), { verifier: other })).status).toBe(400);
  const code = await codeFor('staff-ines-lund');
  expect((await exchange(code)).status).toBe(200);
  expect((await exchange(code)).status).toBe(400);
});

it('says what to do when a sign-in has run out', async () => {
  const page = await fetch(`${identity.issuer}/who/unknown`);
  expect(page.status).toBe(400);
  expect(await page.text()).toContain('Go back to the shop and sign in again.');
});

it('keeps its cookies under names of its own', async () => {
  const visitor = new Visitor();
  await codeFor('staff-ines-lund', visitor);
  await visitor.open(authorisation());
  const names = visitor.cookieNames().map((name) => name.replace(/\.sig$/, ''));
  expect(names.length).toBeGreaterThan(0);
  expect(names.every((name) => name.startsWith('local_identity_'))).toBe(true);
});

it('is out of order, gone and itself again on request', async () => {
  await identity.fault({ kind: 'refuse' });
  expect((await fetch(authorisation())).status).toBe(500);
  await identity.fault({ kind: 'gone' });
  await expect(fetch(authorisation())).rejects.toThrow();
  await identity.fault({ kind: 'none' });
  expect((await new Visitor().open(authorisation())).status).toBe(200);
});

it('prints nothing about itself', () => {
  expect(said.flatMap((spy) => spy.mock.calls)).toEqual([]);
});
