import type { Route } from './+types/changes';
import { viewerContext } from '#app/context.ts';
import { problemResponse } from '#app/lib/problem.ts';
import { readVersion } from '#server/changes/read-version.ts';

/** Tells an open page whether what it shows is still so; see app/lib/use-changes.ts. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const number = url.searchParams.get('case');
  const headers = { 'Cache-Control': 'no-store' };
  try {
    const version = await readVersion(context.get(viewerContext), { number });
    return Response.json({ version }, { headers });
  } catch (error) {
    return problemResponse(error);
  }
}
