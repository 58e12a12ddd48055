const NOWHERE = 'http://nowhere.invalid';
const NOT_BACK_TO = /^\/(?:sign-in|sign-out|api)(?:\/|$)/;

/**
 * The path on this site that `wanted` names, or null: another origin, a path that a browser reads as
 * one (`//`, `/\`), and the sign-in pages themselves are refused.
 */
export function safeReturn(wanted: string | null): string | null {
  if (wanted === null || !/^\/(?![/\\])[\x21-\x7e]*$/.test(wanted)) return null;
  const url = new URL(wanted, NOWHERE);
  if (url.origin !== NOWHERE || NOT_BACK_TO.test(url.pathname)) return null;
  // Resolving the dots may have left two slashes in front.
  return url.pathname.startsWith('//') ? null : url.pathname + url.search;
}

/** The sign-in page that leads back to `path` afterwards. */
export function signInPath(path: string): string {
  const back = safeReturn(path);
  return back === null || back === '/' ? '/sign-in' : `/sign-in?return=${encodeURIComponent(back)}`;
}
