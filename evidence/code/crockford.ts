/** Crockford's base 32: the digits, then letters without I, L, O and U. */
export const ALPHABET = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';
/** The five signs that stand only for check values 32 to 36. */
export const CHECK_ONLY = '*~$=U';
/** How many signs carry the 50 bits; one check sign follows them. */
export const DATA_SIGNS = 10;

/** The check sign of ten signs: the 50 bits as a number, modulo 37. */
export function checkSign(data: string): string {
  const value = [...data].reduce((sum, sign) => sum * 32n + BigInt(ALPHABET.indexOf(sign)), 0n);
  return (ALPHABET + CHECK_ONLY)[Number(value % 37n)]!;
}

/** Whether a text is a code in its stored form: eleven signs, upper case, the last its check. */
export function isCode(text: string): boolean {
  return (
    text.length === DATA_SIGNS + 1 &&
    [...text].every((sign) => ALPHABET.includes(sign)) &&
    checkSign(text.slice(0, DATA_SIGNS)) === text[DATA_SIGNS]
  );
}
