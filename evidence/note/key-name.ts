/**
 * Whether a text can name a note's key: not empty, no Unicode space (U+0085 is one to Go and not
 * to JavaScript), no control character, no plus (C2SP signed-note, "Format").
 */
export function isKeyName(name: string): boolean {
  // eslint-disable-next-line no-control-regex -- control characters are what is looked for
  return name !== '' && !/[\s+\u0000-\u001f\u0085]/u.test(name);
}
