import { redirect } from 'react-router';
import type { Route } from './+types/callback';
import { translate } from '#app/lib/problem.ts';
import { safeReturn } from '#app/lib/return-path.ts';
import { SignInForm } from './sign-in-form.tsx';
import { returnCookie } from '#server/auth/cookies.ts';
import { findPerson } from '#server/auth/find-person.ts';
import { identifyStaff } from '#server/auth/identify-staff.ts';
import { startSession } from '#server/auth/start-session.ts';

/** Where the identity provider sends a person of the shop back to. */
export async function loader({ request, url }: Route.LoaderArgs) {
  // Without a state the strategy would begin another sign-in.
  if (!url.searchParams.has('state')) throw redirect('/sign-in');
  const headers = new Headers();
  try {
    const { subject, at } = await identifyStaff(request);
    const personId = await findPerson(subject);
    headers.append('Set-Cookie', await startSession(request, { personId, freshAt: at }));
  } catch (error) {
    return translate(error);
  }
  const kept: unknown = await returnCookie().parse(request.headers.get('Cookie'));
  headers.append('Set-Cookie', await returnCookie().serialize('', { maxAge: 0 }));
  const back = safeReturn(typeof kept === 'string' ? kept : null);
  throw redirect(back ?? '/bench', { headers });
}

export default function Callback({ loaderData }: Route.ComponentProps) {
  return <SignInForm back={null} problem={loaderData} />;
}
