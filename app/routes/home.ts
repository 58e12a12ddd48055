import { redirect } from 'react-router';
import type { Route } from './+types/home';
import { viewerContext } from '#app/context.ts';
import { homeOf } from '#app/lib/home-of.ts';

export function loader({ context }: Route.LoaderArgs) {
  return redirect(homeOf(context.get(viewerContext)));
}
