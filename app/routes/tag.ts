import { redirect } from 'react-router';
import type { Route } from './+types/tag';
import { viewerContext } from '#app/context.ts';
import { refuse } from '#app/lib/problem.ts';
import { findTagged } from '#server/tags/find-tagged.ts';

/** Where the code on a printed tag leads: staff to adding to the timeline, owners to their case, others to Verify. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const number = await findTagged(viewer, params).catch(refuse);
  if (number === null) return redirect('/verify');
  return redirect(
    viewer.kind === 'staff' ? `/bench/cases/${number}/add` : `/portal/cases/${number}`,
  );
}
