import { data } from 'react-router';
import {
  Conflict,
  Invalid,
  NotAllowed,
  NotFound,
  Problem,
  TooLarge,
  TooMany,
  Unsupported,
} from '#domain/errors.ts';

/** What an action hands back to its page, and a loader to the error page. */
export interface ProblemView {
  code: string;
  problem: string;
  fields: Record<string, string>;
}

const STATUS = [
  [Invalid, 400],
  [NotAllowed, 403],
  [NotFound, 404],
  [Conflict, 409],
  [TooLarge, 413],
  [Unsupported, 415],
  [TooMany, 429],
] as const;

/** The HTTP status of a problem; an outside service that does not answer is 503. */
export function statusOf(problem: Problem): number {
  return STATUS.find(([kind]) => problem instanceof kind)?.[1] ?? 503;
}

function init(problem: Problem): ResponseInit {
  const headers = new Headers();
  if (problem instanceof TooMany) headers.set('Retry-After', String(problem.retryAfter));
  return { status: statusOf(problem), headers };
}

/**
 * For actions: the answer that shows the form again with the sentence.
 * Rethrows what is not a Problem.
 */
export function translate(error: unknown) {
  if (!(error instanceof Problem)) throw error;
  const { code, sentence: problem, fields } = error;
  return data<ProblemView>({ code, problem, fields }, init(error));
}

/** For loaders, as `.catch(refuse)`: throws the answer that shows the error page with the sentence. */
export function refuse(error: unknown): never {
  throw translate(error);
}

/** For resource routes: `{ code, sentence, fields }` as JSON. Rethrows what is not a Problem. */
export function problemResponse(error: unknown): Response {
  if (!(error instanceof Problem)) throw error;
  const { code, sentence, fields } = error;
  return Response.json({ code, sentence, fields }, init(error));
}
