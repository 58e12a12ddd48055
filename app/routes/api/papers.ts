import { Readable } from 'node:stream';
import type { Route } from './+types/papers';
import { viewerContext } from '#app/context.ts';
import { problemResponse } from '#app/lib/problem.ts';
import { readPaper } from '#server/warranty/read-paper.ts';
import { hasAlready } from './byte-range.ts';

/** A warranty's paper, byte for byte as it was handed out, for its owner and the shop's people. */
export async function loader({ request, params, context }: Route.LoaderArgs) {
  try {
    const paper = await readPaper(context.get(viewerContext), params);
    const etag = `"${paper.sha256}"`;
    const headers = new Headers({
      'Content-Type': 'application/pdf',
      'Content-Length': String(paper.length),
      'Content-Disposition': `inline; filename="${paper.fileName}"`,
      'Cache-Control': 'private, max-age=604800, immutable',
      ETag: etag,
      'X-Content-Type-Options': 'nosniff',
    });
    if (hasAlready(request.headers, etag)) {
      headers.delete('Content-Length');
      return new Response(null, { status: 304, headers });
    }
    if (request.method === 'HEAD') return new Response(null, { headers });
    return new Response(Readable.toWeb(await paper.open()) as ReadableStream, { headers });
  } catch (error) {
    return problemResponse(error);
  }
}
