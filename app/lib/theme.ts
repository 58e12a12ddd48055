/** Forced light or dark; null follows the device. */
export type ForcedTheme = 'light' | 'dark' | null;

/** The theme that the staff menu's switch keeps in the cookie `theme`. */
export function themeOf(cookies: string | null): ForcedTheme {
  const [, theme] = /(?:^|;\s*)theme=(light|dark)(?:;|$)/.exec(cookies ?? '') ?? [];
  return theme === 'light' || theme === 'dark' ? theme : null;
}
