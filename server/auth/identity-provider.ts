import { createRemoteJWKSet, jwtVerify } from 'jose';
import { OAuth2Strategy } from 'remix-auth-oauth2';
import { z } from 'zod';
import { env } from '../env.ts';

/** Whom the identity provider vouches for. `at`: when they last showed who they are. */
export interface Identity {
  subject: string;
  at: Date;
}

/** How long the identity provider may take for one answer. */
export const PATIENCE_MS = 6_000;
const KEPT_MS = 60 * 60 * 1000;

// OpenID Connect Discovery 1.0, section 3.
const DiscoverySchema = z.object({
  issuer: z.string(),
  authorization_endpoint: z.url(),
  token_endpoint: z.url(),
  jwks_uri: z.url(),
});

// OpenID Connect Core 1.0, section 2; auth_time is there because max_age is asked for.
const ClaimsSchema = z.object({ sub: z.string().min(1).max(255), auth_time: z.number().int() });

class StaffStrategy extends OAuth2Strategy<Identity> {
  override authorizationParams(params: URLSearchParams, request: Request): URLSearchParams {
    const asked = new URLSearchParams(params);
    asked.set('max_age', String(12 * 60 * 60));
    if (new URL(request.url).searchParams.has('fresh')) asked.set('prompt', 'login');
    return asked;
  }
}

async function discover(): Promise<StaffStrategy> {
  const { OAUTH_ISSUER, OAUTH_CLIENT_ID, OAUTH_CLIENT_SECRET, PUBLIC_URL } = env();
  const where = `${OAUTH_ISSUER.replace(/\/$/, '')}/.well-known/openid-configuration`;
  const answer = await fetch(where, { signal: AbortSignal.timeout(PATIENCE_MS) });
  if (!answer.ok) throw new Error(`the identity provider answered ${answer.status}`);
  const found = DiscoverySchema.parse(await answer.json());
  const keys = createRemoteJWKSet(new URL(found.jwks_uri), { timeoutDuration: PATIENCE_MS });
  const secure = PUBLIC_URL.startsWith('https:') ? ({ secure: true } as const) : {};
  return new StaffStrategy(
    {
      clientId: OAUTH_CLIENT_ID,
      clientSecret: OAUTH_CLIENT_SECRET,
      redirectURI: `${PUBLIC_URL}/sign-in/callback`,
      authorizationEndpoint: found.authorization_endpoint,
      tokenEndpoint: found.token_endpoint,
      scopes: ['openid'],
      cookie: {
        name: 'witnessmark-state',
        path: '/sign-in',
        maxAge: 10 * 60,
        httpOnly: true,
        sameSite: 'Lax',
        ...secure,
      },
    },
    async ({ tokens }) => {
      const { payload } = await jwtVerify(tokens.idToken(), keys, {
        issuer: found.issuer,
        audience: OAUTH_CLIENT_ID,
        clockTolerance: 60,
      });
      const { sub, auth_time: at } = ClaimsSchema.parse(payload);
      return { subject: sub, at: new Date(at * 1000) };
    },
  );
}

let held: { strategy: Promise<StaffStrategy>; until: number } | undefined;

/**
 * The way to the identity provider of OAUTH_ISSUER, found at first use and kept for an hour: the
 * server starts without it, and an answer that failed is not kept.
 */
export function staffStrategy(): Promise<StaffStrategy> {
  if (held === undefined || held.until < Date.now()) {
    const strategy = discover();
    held = { strategy, until: Date.now() + KEPT_MS };
    strategy.catch(() => {
      held = undefined;
    });
  }
  return held.strategy;
}
