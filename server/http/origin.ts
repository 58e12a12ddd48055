import type { RequestHandler } from 'express';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Refuses every change that a page of another site asks for, on resource routes too: browsers send
 * Origin with each of them. `origin` is the address people open, without a slash.
 */
export function ownOrigin(origin: string): RequestHandler {
  const sentence = `This was sent from a page of another address. Open ${origin} and do it there.`;
  const { host } = new URL(origin);
  return (request, response, next) => {
    if (SAFE.has(request.method)) {
      next();
      return;
    }
    if (request.get('Origin') !== origin) {
      response.status(403).json({ code: 'other-origin', sentence });
      return;
    }
    // The router compares Origin with Host once more; a proxy may have put its own name there.
    request.headers.host = host;
    next();
  };
}
