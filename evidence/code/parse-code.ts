import { isCode } from '#evidence/code/crockford.ts';
import { CodeError } from '#evidence/errors.ts';

/**
 * Reads a code as somebody typed it: hyphens, dashes, spaces and case do not matter, O is taken
 * for 0, I and L for 1.
 * @returns the eleven signs as they are stored
 * @throws CodeError with a sentence for whoever typed it
 */
export function parseCode(typed: string): string {
  const code = typed
    .normalize('NFKC')
    .replace(/[\s\p{Pd}]/gu, '')
    .toUpperCase()
    .replaceAll('O', '0')
    .replace(/[IL]/g, '1');
  if (code.length !== 11) {
    throw new CodeError('A code has eleven signs. Compare it with your paper.');
  }
  if (!isCode(code)) {
    throw new CodeError('This code has a slip in it. Compare it with your paper sign by sign.');
  }
  return code;
}
