import { useEffect, useState } from 'react';
import { Form } from 'react-router';
import { ThemeSwitch, type Theme } from '#app/ui/bar/theme-switch.tsx';
import { Button } from '#app/ui/control/button.tsx';

const YEAR_S = 31_536_000;

function chosenTheme(): Theme {
  const { theme } = document.documentElement.dataset;
  return theme === 'light' || theme === 'dark' ? theme : 'device';
}

function chooseTheme(theme: Theme): void {
  const { dataset } = document.documentElement;
  if (theme === 'device') delete dataset.theme;
  else dataset.theme = theme;
  const age = theme === 'device' ? 0 : YEAR_S;
  document.cookie = `theme=${theme}; path=/; max-age=${age}; samesite=lax`;
}

/** Under the name of whoever is signed in: theme and the way out. */
export function StaffMenu() {
  // Only a script can change the theme, so the switch is there once a script runs.
  const [theme, setTheme] = useState<Theme>();
  useEffect(() => setTheme(chosenTheme()), []);
  return (
    <>
      {theme && (
        <ThemeSwitch
          theme={theme}
          onChoose={(wanted) => {
            chooseTheme(wanted);
            setTheme(wanted);
          }}
        />
      )}
      <Form method="post" action="/sign-out">
        <Button wide>Sign out</Button>
      </Form>
    </>
  );
}
