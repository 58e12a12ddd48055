import { redirect } from 'react-router';
import type { Route } from './+types/staff';
import { translate } from '#app/lib/problem.ts';
import { safeReturn } from '#app/lib/return-path.ts';
import { SignInForm } from './sign-in-form.tsx';
import { returnCookie } from '#server/auth/cookies.ts';
import { identifyStaff } from '#server/auth/identify-staff.ts';

/** Sends a person of the shop to the identity provider; `?fresh` asks them to show who they are again. */
export async function loader({ request, url }: Route.LoaderArgs) {
  if (url.searchParams.has('state')) throw redirect('/sign-in/staff');
  const back = safeReturn(url.searchParams.get('return'));
  try {
    await identifyStaff(request);
    throw redirect('/sign-in');
  } catch (error) {
    if (!(error instanceof Response)) return translate(error);
    error.headers.append('Set-Cookie', await returnCookie().serialize(back));
    throw error;
  }
}

export default function Staff({ loaderData }: Route.ComponentProps) {
  return <SignInForm back={null} problem={loaderData} />;
}
