import { PassThrough } from 'node:stream';
import { createReadableStreamFromReadable } from '@react-router/node';
import { isbot } from 'isbot';
import { renderToPipeableStream } from 'react-dom/server';
import {
  isRouteErrorResponse,
  ServerRouter,
  type EntryContext,
  type HandleErrorFunction,
  type RouterContextProvider,
} from 'react-router';
import { nonceContext, requestContext } from '#server/http/context.ts';
import { log } from '#server/log.ts';

/** How long a deferred value may keep a page open, in ms. */
export const streamTimeout = 5_000;

/** Renders a page to HTML; its inline scripts carry the answer's nonce. */
export default function handleRequest(
  request: Request,
  status: number,
  headers: Headers,
  routerContext: EntryContext,
  loadContext: RouterContextProvider,
): Promise<Response> | Response {
  headers.set('Content-Type', 'text/html; charset=utf-8');
  if (!headers.has('Cache-Control')) headers.set('Cache-Control', 'private, no-cache');
  if (request.method === 'HEAD') return new Response(null, { status, headers });

  const nonce = loadContext.get(nonceContext);
  const wholeFirst = isbot(request.headers.get('User-Agent')) || routerContext.isSpaMode;
  return new Promise((resolve, reject) => {
    let shellSent = false;
    let rendered = status;
    const send = () => {
      shellSent = true;
      const body = new PassThrough({
        final(done) {
          clearTimeout(timer);
          done();
        },
      });
      resolve(new Response(createReadableStreamFromReadable(body), { status: rendered, headers }));
      pipe(body);
    };
    const { pipe, abort } = renderToPipeableStream(
      <ServerRouter context={routerContext} url={request.url} nonce={nonce} />,
      {
        nonce,
        [wholeFirst ? 'onAllReady' : 'onShellReady']: send,
        onShellError(error) {
          clearTimeout(timer);
          reject(error instanceof Error ? error : new Error('a page threw what is no error'));
        },
        onError(error: unknown) {
          rendered = 500;
          // What fails before the shell is handed to onShellError and logged there.
          if (shellSent) log.error({ err: error }, 'a page broke off while rendering');
        },
      },
    );
    const timer = setTimeout(abort, streamTimeout + 1_000);
  });
}

/** Logs what a loader, action or page threw: never the request's words, only where and what kind. */
export const handleError: HandleErrorFunction = (error, { request, context }) => {
  if (request.signal.aborted) return;
  // Thrown answers (404 and the like) are spoken to people, not faults of the program.
  if (isRouteErrorResponse(error) && error.status < 500) return;
  const { id, pattern } = context.get(requestContext);
  log.error({ err: error, request: id, pattern }, 'a request failed');
};
