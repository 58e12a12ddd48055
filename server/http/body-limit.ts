import type { Request, RequestHandler, Response } from 'express';

/** Forms and JSON: far above the longest note, far below what fills a disk. */
export const FORM_BYTES = 1024 * 1024;

/** What is still read of a body nobody wants, so that the sender gets to see the answer. */
const DRAIN_BYTES = 80 * 1024 * 1024;

function drain(request: Request): void {
  let left = DRAIN_BYTES;
  // Whoever was reading for the route would pause the stream at its next piece.
  request.removeAllListeners('data');
  request.on('data', (chunk: Buffer) => {
    left -= chunk.length;
    if (left < 0) request.destroy();
  });
  request.resume();
}

function refuse(request: Request, response: Response, status: number, sentence: string): void {
  const code = status === 413 ? 'too-large' : 'length-required';
  response.status(status).json({ code, sentence });
  drain(request);
}

/**
 * Refuses bodies of unknown length (411) and, where `limitOf` gives a limit in bytes, longer ones
 * (413). Node itself never hands on more than Content-Length says. A body that a route leaves
 * unread is read to its end after the answer, because a browser reports a cut connection instead.
 */
export function bodyLimit(limitOf: (request: Request) => number | null): RequestHandler {
  return (request, response, next) => {
    if (request.get('Transfer-Encoding') !== undefined) {
      refuse(request, response, 411, 'This was sent without its length. Send it as a whole.');
      return;
    }
    const limit = limitOf(request);
    if (limit !== null && Number(request.get('Content-Length') ?? 0) > limit) {
      refuse(
        request,
        response,
        413,
        'This is more than the form takes. Shorten it and send it again.',
      );
      return;
    }
    response.on('finish', () => {
      if (!request.readableEnded && !request.destroyed) drain(request);
    });
    next();
  };
}
