import { Readable } from 'node:stream';
import type { Route } from './+types/media';
import { viewerContext } from '#app/context.ts';
import { problemResponse } from '#app/lib/problem.ts';
import { Unavailable } from '#domain/errors.ts';
import { findMedia, type Media } from '#server/photos/find-media.ts';
import { getStream } from '#server/storage/objects.ts';
import { byteRange, hasAlready } from './byte-range.ts';

// The address names bytes that never change; what may change is the right to see them, and that is
// asked before any byte leaves the server. Signing out clears what a browser has kept.
const KEEP = 'private, max-age=604800, immutable';

function headersOf({ mediaType, saveAs }: Media, etag: string): Headers {
  const headers = new Headers({
    'Content-Type': mediaType,
    'Cache-Control': KEEP,
    ETag: etag,
    'Accept-Ranges': 'bytes',
  });
  if (saveAs !== null) headers.set('Content-Disposition', `attachment; filename="${saveAs}"`);
  return headers;
}

/** A photo's original or copy, whole or in part, for whoever may see it. */
export async function loader({ request, params, context }: Route.LoaderArgs) {
  try {
    const media = await findMedia(context.get(viewerContext), params);
    const etag = `"${media.sha256}"`;
    const headers = headersOf(media, etag);
    if (hasAlready(request.headers, etag)) return new Response(null, { status: 304, headers });

    const range = byteRange(request.headers, { length: media.bytes, etag });
    if (range === 'outside') {
      headers.set('Content-Range', `bytes */${media.bytes}`);
      headers.delete('Cache-Control');
      return new Response(null, { status: 416, headers });
    }
    const part = range === 'whole' ? undefined : range;
    if (part) headers.set('Content-Range', `bytes ${part.start}-${part.end}/${media.bytes}`);
    headers.set('Content-Length', String(part ? part.end - part.start + 1 : media.bytes));
    const status = part ? 206 : 200;
    if (request.method === 'HEAD') return new Response(null, { status, headers });

    const stream = await getStream(media.objectKey, part);
    if (stream === undefined) throw new Unavailable('store');
    return new Response(Readable.toWeb(stream) as ReadableStream, { status, headers });
  } catch (error) {
    return problemResponse(error);
  }
}
