import { expect, it } from 'vitest';
import { themeOf } from './theme.ts';

it.each([
  ['theme=dark', 'dark'],
  ['a=b; theme=light; c=d', 'light'],
  ['theme=device', null],
  ['other-theme=dark', null],
  ['theme=dark"><script>', null],
  [null, null],
] as const)('reads the theme of %j', (cookies, theme) => {
  expect(themeOf(cookies)).toBe(theme);
});
