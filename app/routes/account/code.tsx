import { useRef } from 'react';
import { Form, redirect } from 'react-router';
import type { Route } from './+types/code';
import { translate } from '#app/lib/problem.ts';
import { textsOf } from '#app/lib/read-form.ts';
import { CodeField } from '#app/ui/sign-in/code-field.tsx';
import { SignInFrame } from '#app/ui/sign-in/sign-in-frame.tsx';
import { Button } from '#app/ui/control/button.tsx';
import { useFirstWrongField } from '#app/ui/control/use-first-wrong-field.ts';
import { Notice } from '#app/ui/notice.tsx';
import { askForCode } from '#server/auth/ask-for-code.ts';
import { checkCode } from '#server/auth/check-code.ts';
import { keepCodeRequest, readCodeRequest } from '#server/auth/code-request.ts';
import { startSession } from '#server/auth/start-session.ts';
import { requestContext } from '#server/http/context.ts';

export async function loader({ request }: Route.LoaderArgs) {
  const asked = await readCodeRequest(request);
  if (asked === null) throw redirect('/sign-in');
  return { email: asked.email };
}

export async function action({ request, context }: Route.ActionArgs) {
  const asked = await readCodeRequest(request);
  if (asked === null) throw redirect('/sign-in');
  const { intent, code = '' } = textsOf(await request.formData());
  const { ip } = context.get(requestContext);
  const headers = new Headers();
  try {
    if (intent === 'send again') {
      const again = await askForCode({ email: asked.email, ip });
      headers.append('Set-Cookie', await keepCodeRequest({ ...asked, ...again }));
      return redirect('/sign-in/code', { headers });
    }
    const { token, back } = asked;
    const customerId = await checkCode({ token, code, ip });
    headers.append('Set-Cookie', await startSession(request, { customerId }));
    headers.append('Set-Cookie', await keepCodeRequest(null));
    return redirect(back ?? '/portal', { headers });
  } catch (error) {
    return translate(error);
  }
}

export default function Code({ loaderData, actionData }: Route.ComponentProps) {
  const form = useRef<HTMLFormElement>(null);
  useFirstWrongField(form, actionData);
  const wrong = actionData?.fields.code;
  const over = actionData?.code === 'code-over';
  return (
    <SignInFrame title="Enter the code" other={{ href: '/sign-in', label: 'Use another address' }}>
      <title>Enter the code · Witnessmark</title>
      <p className="text-ink-2">
        If <b className="text-ink">{loaderData.email}</b> belongs to an instrument here, a code has
        gone there. It is good for ten minutes, in this browser only.
      </p>
      {actionData && wrong === undefined && (
        <Notice tone="failed" lead={actionData.problem} alert />
      )}
      <Form method="post" ref={form} noValidate className="grid gap-4">
        <CodeField name="code" error={wrong} />
        {!over && (
          <Button kind="primary" size="tall" wide name="intent" value="sign in">
            Sign in
          </Button>
        )}
        <Button kind={over ? 'primary' : 'text'} size="tall" wide name="intent" value="send again">
          Send a new code
        </Button>
      </Form>
    </SignInFrame>
  );
}
