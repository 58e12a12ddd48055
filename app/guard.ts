import { data, redirect, type MiddlewareFunction } from 'react-router';
import { NotAllowed, NotFound, Problem } from '#domain/errors.ts';
import type { Viewer } from '#domain/viewer.ts';
import { sessionViewer } from '#server/auth/session-viewer.ts';
import { requestContext } from '#server/http/context.ts';
import { decide } from './access.ts';
import { viewerContext } from './context.ts';
import { problemResponse, refuse } from './lib/problem.ts';
import { signInPath } from './lib/return-path.ts';

const SIGNED_OUT = 'You are signed out. Sign in and try again.';
const NO_METHOD =
  'Nothing can be changed under this address. Go back and use the page’s own buttons.';

const STAFF_ONLY = new NotAllowed(
  'This page is for the people of the shop. Your instruments are under “My instruments”.',
);
const CUSTOMERS_ONLY = new NotAllowed(
  'This page is the owner’s own. Find the case from the Rack instead.',
);

function forbidden(pattern: string, viewer: Viewer): Problem {
  if (viewer.kind === 'customer' && pattern.startsWith('/bench')) return STAFF_ONLY;
  if (viewer.kind === 'staff' && pattern.startsWith('/portal')) return CUSTOMERS_ONLY;
  return new NotAllowed();
}

/** Nothing the guard says may be kept by anyone on the way: with another session it would say otherwise. */
function guarded(response: Response): Response {
  if (!response.headers.has('Cache-Control')) {
    response.headers.set('Cache-Control', 'private, no-cache');
  }
  return response;
}

function refusal(problem: Problem, forPrograms: boolean): never {
  if (forPrograms) throw guarded(problemResponse(problem));
  return refuse(problem);
}

const forProgram = (code: string, sentence: string, status: number) =>
  guarded(Response.json({ code, sentence }, { status }));

/**
 * The one door of the application: finds out who is asking, and lets the request through to the
 * route only if app/access.ts says so. Runs for pages, their data, actions and resource routes alike.
 */
export const guard: MiddlewareFunction<Response> = async (
  { request, url, pattern, context },
  next,
) => {
  const path = pattern.startsWith('/') ? pattern : `/${pattern}`;
  const forPrograms = path.startsWith('/api/');
  context.get(requestContext).pattern = path;
  const viewer = await sessionViewer(request).catch((error: unknown) =>
    error instanceof Problem ? refusal(error, forPrograms) : Promise.reject(error as Error),
  );
  context.set(viewerContext, viewer);
  switch (decide(path, request.method, viewer)) {
    case 'go':
      break;
    case 'sign in':
      if (forPrograms) throw forProgram('signed-out', SIGNED_OUT, 401);
      throw guarded(redirect(signInPath(url.pathname + url.search)));
    case 'forbidden':
      return refusal(forbidden(path, viewer), forPrograms);
    case 'no such method':
      if (forPrograms) throw forProgram('method', NO_METHOD, 405);
      throw data({ code: 'method', problem: NO_METHOD, fields: {} }, { status: 405 });
    case 'no such route':
      return refusal(new NotFound(), forPrograms);
  }
  return guarded(await next());
};
