import { useRef } from 'react';
import { Form } from 'react-router';
import { SignInFrame, SignInOr } from '#app/ui/sign-in/sign-in-frame.tsx';
import { Button, ButtonLink } from '#app/ui/control/button.tsx';
import { TextField } from '#app/ui/control/text-field.tsx';
import { useFirstWrongField } from '#app/ui/control/use-first-wrong-field.ts';
import { Notice } from '#app/ui/notice.tsx';
import { fieldsOf } from '#app/lib/field-of.ts';
import type { ProblemView } from '#app/lib/problem.ts';
import type { Retry } from '#app/lib/retry.ts';

interface Props {
  /** Where to go after the sign-in. */
  back: string | null;
  problem: ProblemView | Retry | undefined;
}

/** Both ways in: the shop's account for staff, a code by e-mail for owners. */
export function SignInForm({ back, problem }: Props) {
  const form = useRef<HTMLFormElement>(null);
  useFirstWrongField(form, problem);
  const query = back === null ? '' : `?return=${encodeURIComponent(back)}`;
  const wrong = problem?.fields.email;
  return (
    <SignInFrame title="Sign in">
      <title>Sign in · Witnessmark</title>
      {problem && wrong === undefined && <Notice tone="failed" lead={problem.problem} alert />}
      <ButtonLink to={`/sign-in/staff${query}`} reloadDocument size="tall" icon="key" wide>
        Staff: sign in with the shop’s account
      </ButtonLink>
      <SignInOr />
      <Form method="post" action={`/sign-in${query}`} ref={form} noValidate className="grid gap-4">
        <TextField
          label="Owners: your e-mail address"
          type="email"
          autoComplete="email"
          inputMode="email"
          tall
          {...fieldsOf(problem)('email')}
        />
        <Button kind="primary" size="tall" wide>
          Send a code
        </Button>
      </Form>
    </SignInFrame>
  );
}
