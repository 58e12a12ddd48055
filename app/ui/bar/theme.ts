import type { Theme } from './theme-switch.tsx';

const YEAR_S = 31_536_000;

/** The forced theme in a Cookie header; 'device' when there is none. For the root's `data-theme`. */
export function themeOf(cookies: string | null): Theme {
  const found = /(?:^|;\s*)theme=(light|dark)(?:;|$)/.exec(cookies ?? '');
  return (found?.[1] as Theme | undefined) ?? 'device';
}

/** Forces a theme at once, and for this browser's next visits. */
export function chooseTheme(theme: Theme): void {
  if (theme === 'device') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
  const keep = theme === 'device' ? 0 : YEAR_S;
  document.cookie = `theme=${theme}; Path=/; Max-Age=${keep}; SameSite=Lax`;
}
