import { Form } from 'react-router';
import { chooseTheme } from '#app/ui/bar/theme.ts';
import { ThemeSwitch, type Theme } from '#app/ui/bar/theme-switch.tsx';
import { Button } from '#app/ui/control/button.tsx';

/** Under the name of whoever is signed in: theme and the way out. */
export function StaffMenu({ theme }: { theme: Theme }) {
  return (
    <>
      <ThemeSwitch theme={theme} onChoose={chooseTheme} />
      <Form method="post" action="/sign-out">
        <Button wide>Sign out</Button>
      </Form>
    </>
  );
}
