import type { Route } from './+types/changes';
import { viewerContext } from '#app/context.ts';
import { refuse } from '#app/lib/problem.ts';
import { readVersion } from '#server/changes/read-version.ts';

/** Tells an open page whether what it shows is still so; see app/lib/use-changes.ts. */
export async function loader({ context, url }: Route.LoaderArgs) {
  const number = url.searchParams.get('case');
  return { version: await readVersion(context.get(viewerContext), { number }).catch(refuse) };
}
