import { join } from 'node:path';
import { createRequestHandler } from '@react-router/express';
import compression from 'compression';
import express, { type ErrorRequestHandler, type Express } from 'express';
import { RouterContextProvider } from 'react-router';
import { env } from './env.ts';
import { bodyLimit, FORM_BYTES } from './http/body-limit.ts';
import { nonceContext, requestContext, type RequestFacts } from './http/context.ts';
import { securityHeaders } from './http/headers.ts';
import { ownOrigin } from './http/origin.ts';
import { precompressed } from './http/precompressed.ts';
import { requestLog } from './http/request-log.ts';
import { log } from './log.ts';

/** The built routes and their modules; also what the tests of the rights walk. */
export const serverBuild = () => import('virtual:react-router/server-build');

export { closeDatabase } from './db/connection.ts';

// Photos have their own limit, which their route knows and explains.
const PHOTO = /^\/api\/cases\/[^/]+\/photos\/[^/]+$/;

const lastResort: ErrorRequestHandler = (error, _request, response, next) => {
  log.error({ err: error as unknown }, 'a request failed outside the routes');
  if (response.headersSent) {
    next(error);
    return;
  }
  response
    .status(500)
    .type('text/plain')
    .send('The shop’s program broke. Nothing you entered was changed. Try again in a minute.');
};

/** The HTTP application; `client` is the folder of the built static files. */
export function createApp({ client = join(process.cwd(), 'build/client') } = {}): Express {
  const { PUBLIC_URL, TRUST_PROXY } = env();
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', TRUST_PROXY);
  app.use(securityHeaders({ https: PUBLIC_URL.startsWith('https:') }));
  app.use(precompressed(client));
  app.use(
    '/assets',
    express.static(join(client, 'assets'), { immutable: true, maxAge: '1y', index: false }),
    (_request, response) => {
      response.status(404).type('text/plain').send('There is no such file. Load the page anew.');
    },
  );
  app.use(express.static(client, { maxAge: '1h', index: false, redirect: false }));
  app.use(requestLog);
  app.use(ownOrigin(PUBLIC_URL));
  app.use(bodyLimit(({ path }) => (PHOTO.test(path) ? null : FORM_BYTES)));
  app.use(compression());
  app.use(
    createRequestHandler({
      build: serverBuild,
      getLoadContext: (_request, { locals }) => {
        const context = new RouterContextProvider();
        context.set(nonceContext, locals.nonce as string);
        context.set(requestContext, locals.facts as RequestFacts);
        return context;
      },
    }),
  );
  app.use(lastResort);
  return app;
}
