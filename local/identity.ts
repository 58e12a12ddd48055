import { randomBytes } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import { exportJWK, generateKeyPair } from 'jose';
import type { JWK } from 'jose';
import type { Configuration, Provider } from 'oidc-provider';
import { demoStaff } from './demo-staff.ts';
import { FaultSwitch, failing, withSwitch } from './faults.ts';
import type { Fault } from './faults.ts';
import { interactionPath, serveInteraction } from './identity-page.ts';
import { escapeHtml, page, pageHeaders } from './page.ts';
import { freePort } from './ports.ts';
import { runAsProgram } from './stand-in.ts';
import type { StandIn } from './stand-in.ts';
import { serveLocally } from './web-server.ts';

export interface IdentityOptions {
  /** 0 chooses a free one. */
  port: number;
  clientId: string;
  clientSecret: string;
  /** Where the shop's sign-in may send people back to; compared letter by letter. */
  redirectUris: string[];
}

export interface Identity extends StandIn {
  issuer: string;
  fault: (fault: Fault) => Promise<void>;
}

const tenMinutes = 600;
const cookieNames = {
  session: 'local_identity_session',
  interaction: 'local_identity_interaction',
  resume: 'local_identity_resume',
};

/**
 * Starts the identity provider on 127.0.0.1: OAuth2 and OpenID Connect with PKCE (S256) required, one confidential
 * client, and a page that lists the demo staff. It remembers nobody: each sign-in asks again who it is.
 */
export async function startIdentity(options: IdentityOptions): Promise<Identity> {
  // The issuer is part of the configuration, so the port has to be known before.
  const port = options.port || (await freePort());
  const issuer = `http://127.0.0.1:${port}`;
  const provider = await createProvider(issuer, options);
  const oidc = provider.callback();
  const faults = new FaultSwitch();
  const server = await serveLocally(
    'The identity provider',
    port,
    withSwitch(
      faults,
      failing(
        faults,
        (response) => response.writeHead(500).end('The identity provider is out of order.\n'),
        (request, response) => {
          forgetSession(request);
          if (request.url?.startsWith(interactionPath))
            void serveInteraction(provider, request, response);
          else void oidc(request, response);
        },
      ),
    ),
  );
  return { issuer, fault: (fault) => faults.set(fault), stop: server.close };
}

async function createProvider(issuer: string, options: IdentityOptions): Promise<Provider> {
  const { privateKey } = await generateKeyPair('ES256', { extractable: true });
  const signingKey = { ...(await exportJWK(privateKey)), use: 'sig' };
  return quietly(async () => {
    const { default: Provider } = await import('oidc-provider');
    return new Provider(issuer, configuration(options, signingKey));
  });
}

function configuration(
  { clientId, clientSecret, redirectUris }: IdentityOptions,
  signingKey: JWK,
): Configuration {
  return {
    clients: [
      {
        client_id: clientId,
        client_secret: clientSecret,
        redirect_uris: redirectUris,
        response_types: ['code'],
        grant_types: ['authorization_code'],
        id_token_signed_response_alg: 'ES256',
      },
    ],
    pkce: { required: () => true },
    claims: { openid: ['sub'], profile: ['name'], email: ['email', 'email_verified'] },
    jwks: { keys: [signingKey] },
    findAccount: (_context, sub) => {
      const person = demoStaff.find((known) => known.sub === sub);
      if (!person) return undefined;
      const { name, email } = person;
      return {
        accountId: sub,
        claims: () => Promise.resolve({ sub, name, email, email_verified: true }),
      };
    },
    // Everything the shop asks for is granted: it is the shop's own provider.
    loadExistingGrant: async ({ oidc }) => {
      const grant = new oidc.provider.Grant({
        clientId: oidc.client?.clientId,
        accountId: oidc.session?.accountId,
      });
      grant.addOIDCScope('openid profile email');
      await grant.save();
      return grant;
    },
    interactions: {
      url: (_context, interaction) => `${interactionPath}${interaction.uid}`,
    },
    features: { devInteractions: { enabled: false }, rpInitiatedLogout: { enabled: false } },
    ttl: {
      AccessToken: tenMinutes,
      AuthorizationCode: 60,
      Grant: tenMinutes,
      IdToken: tenMinutes,
      Interaction: tenMinutes,
      Session: tenMinutes,
    },
    renderError: (context, { error, error_description: description }) => {
      const words = `<p>${escapeHtml(description ?? error)}</p>`;
      context.set(pageHeaders);
      context.body = page('This sign-in cannot go on', words);
    },
    // A browser does not keep cookies of two ports of one host apart.
    cookies: {
      keys: [randomBytes(32).toString('hex')],
      names: cookieNames,
    },
  };
}

/** Takes away what the browser remembers, so that each sign-in asks who it is: a bench has one tablet for all. */
function forgetSession({ headers }: IncomingMessage): void {
  const cookies = headers.cookie?.split('; ') ?? [];
  headers.cookie = cookies.filter((cookie) => !cookie.startsWith(cookieNames.session)).join('; ');
}

/** Runs `work` without the provider's warnings about this Node version and its store in memory. */
async function quietly<Value>(work: () => Promise<Value>): Promise<Value> {
  const { warn, info } = console;
  console.warn = console.info = () => undefined;
  try {
    return await work();
  } finally {
    Object.assign(console, { warn, info });
  }
}

await runAsProgram(import.meta.url, startIdentity);
