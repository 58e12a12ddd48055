import type { RequestHandler } from 'express';
import { v7 } from 'uuid';
import { log } from '../log.ts';
import type { RequestFacts } from './context.ts';

/**
 * Gives each request an id, told in `X-Request-Id`, and logs each answer by its route pattern: paths
 * and queries may hold names and codes, so they are never written.
 */
export const requestLog: RequestHandler = (request, response, next) => {
  const facts: RequestFacts = { id: v7(), ip: request.ip ?? '', pattern: null };
  response.locals.facts = facts;
  response.set('X-Request-Id', facts.id);
  const start = performance.now();
  response.on('close', () => {
    const { id, pattern } = facts;
    const ms = Math.round(performance.now() - start);
    const { method } = request;
    log.info({ request: id, method, pattern, status: response.statusCode, ms }, 'answered');
  });
  next();
};
