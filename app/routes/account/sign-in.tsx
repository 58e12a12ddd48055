import { redirect } from 'react-router';
import type { Route } from './+types/sign-in';
import { viewerContext } from '#app/context.ts';
import { homeOf } from '#app/lib/home-of.ts';
import { textsOf } from '#app/lib/read-form.ts';
import { retry } from '#app/lib/retry.ts';
import { safeReturn } from '#app/lib/return-path.ts';
import { SignInForm } from './sign-in-form.tsx';
import { askForCode } from '#server/auth/ask-for-code.ts';
import { keepCodeRequest } from '#server/auth/code-request.ts';
import { requestContext } from '#server/http/context.ts';

export function loader({ context, url }: Route.LoaderArgs) {
  const viewer = context.get(viewerContext);
  const back = safeReturn(url.searchParams.get('return'));
  if (viewer.kind !== 'public') throw redirect(back ?? homeOf(viewer));
  return { back };
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const form = await request.formData();
  const { email = '' } = textsOf(form);
  const { ip } = context.get(requestContext);
  try {
    const asked = await askForCode({ email, ip });
    const back = safeReturn(url.searchParams.get('return'));
    const kept = await keepCodeRequest({ ...asked, back });
    return redirect('/sign-in/code', { headers: { 'Set-Cookie': kept } });
  } catch (error) {
    return retry(error, form);
  }
}

export default function SignIn({ loaderData, actionData }: Route.ComponentProps) {
  return <SignInForm back={loaderData.back} problem={actionData} />;
}
