import { existsSync } from 'node:fs';
import { join } from 'node:path';
import type { RequestHandler } from 'express';

const TYPES: Record<string, string> = {
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.svg': 'image/svg+xml',
};

/** Sends the `.br` file that the build made beside a static file to browsers that take it. */
export function precompressed(folder: string): RequestHandler {
  const known = new Map<string, boolean>();
  const has = (path: string) => {
    const before = known.get(path);
    if (before !== undefined) return before;
    const found = existsSync(join(folder, `${path}.br`));
    known.set(path, found);
    return found;
  };
  return (request, response, next) => {
    const type = TYPES[/\.\w+$/.exec(request.path)?.[0] ?? ''];
    if (type === undefined || !/^\/(?:[\w-]+\/)*[\w.-]+$/.test(request.path)) {
      next();
      return;
    }
    response.vary('Accept-Encoding');
    if (request.acceptsEncodings(['br']) === 'br' && has(request.path)) {
      request.url = `${request.path}.br`;
      response.set('Content-Type', type);
      response.set('Content-Encoding', 'br');
    }
    next();
  };
}
