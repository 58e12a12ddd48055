import { redirect } from 'react-router';
import type { Route } from './+types/sign-out';
import { translate } from '#app/lib/problem.ts';
import { endSession } from '#server/auth/end-session.ts';

/** Someone typed the address: nothing is changed by opening it. */
export function loader() {
  return redirect('/');
}

export async function action({ request }: Route.ActionArgs) {
  try {
    const headers = new Headers({ 'Set-Cookie': await endSession(request) });
    // The photos this browser kept go too: the next person at it may be someone else.
    headers.set('Clear-Site-Data', '"cache"');
    return redirect('/sign-in', { headers });
  } catch (error) {
    return translate(error);
  }
}
