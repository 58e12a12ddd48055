import { Readable } from 'node:stream';
import type { Route } from './+types/log-entries';
import { problemResponse } from '#app/lib/problem.ts';
import { Invalid, NotFound } from '#domain/errors.ts';
import { newestHead } from '#server/evidence/newest-checkpoint.ts';
import { streamEntries } from '#server/evidence/stream-entries.ts';

const NONE = new NotFound('The log has no signed head yet. Ask again in a minute.');

/** How many entries are wanted: `?size=`, at most those under the newest head. */
function sizeOf(wanted: string | null, newest: number): number {
  if (wanted === null) return newest;
  if (/^[1-9]\d{0,15}$/.test(wanted) && Number(wanted) <= newest) return Number(wanted);
  throw new Invalid({
    size: `The log’s newest head has ${newest} entries. Ask for as many or fewer.`,
  });
}

/**
 * The log's entries from the first on: bundles as C2SP tlog-tiles has them, joined. They are opaque
 * and never change.
 */
export async function loader({ request, url }: Route.LoaderArgs) {
  try {
    const head = await newestHead();
    if (!head) throw NONE;
    const size = sizeOf(url.searchParams.get('size'), head.size);
    const etag = `"entries-${size}"`;
    const headers = {
      'Content-Type': 'application/octet-stream',
      'Cache-Control': 'no-cache',
      ETag: etag,
    };
    if (request.headers.get('If-None-Match') === etag) {
      return new Response(null, { status: 304, headers });
    }
    if (request.method === 'HEAD') return new Response(null, { headers });
    const body = Readable.toWeb(Readable.from(streamEntries(size))) as ReadableStream;
    return new Response(body, { headers });
  } catch (error) {
    return problemResponse(error);
  }
}
