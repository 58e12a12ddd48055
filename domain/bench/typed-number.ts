import type { DecimalSign } from './plain-number.ts';

export interface TypedNumber {
  ok: true;
  value: number;
  /** Whatever stood behind the number, trimmed: "mm", "in", "w" or "". */
  suffix: string;
  /** Written as a fraction: 3/64, 25 1/2. */
  fraction: boolean;
}

export interface NotTyped {
  ok: false;
  code: 'empty' | 'not-a-number' | 'which-decimal';
  /** What the text may have meant, when the signs in it leave more than one reading. */
  meanings: number[];
  suffix: string;
}

const FRACTION = /^([+-]?)(?:(\d+)\s+)?(\d+)\s*\/\s*(\d+)\s*(.*)$/;
const DECIMALS = /^([+-]?)((?:\d[\d.,]*|[.,]\d[\d.,]*))\s*(.*)$/;

/**
 * Reads one number as people type it: decimal comma or point, 3/64, 25 1/2, 25½, a true minus, a
 * unit behind it. One sign alone parts decimals, whichever it is, except where it could as well part
 * thousands ("1,234" in a shop that writes points); that is left open and never guessed.
 */
export function parseTypedNumber(text: string, decimal: DecimalSign): TypedNumber | NotTyped {
  const plain = text
    .replace(/[\u00bc-\u00be\u2150-\u215e]/g, (vulgar) => ` ${vulgar.normalize('NFKC')}`)
    .replace(/\u2044/g, '/')
    .replace(/\u2212/g, '-')
    .replace(/\s+/g, ' ')
    .trim();
  if (plain === '') return { ok: false, code: 'empty', meanings: [], suffix: '' };
  const fraction = FRACTION.exec(plain);
  if (fraction) {
    const [, sign = '', whole = '0', over = '0', under = '1', suffix = ''] = fraction;
    const value = Number(whole) + Number(over) / Number(under);
    return finish(sign, value, suffix, true);
  }
  const number = DECIMALS.exec(plain);
  if (!number) return { ok: false, code: 'not-a-number', meanings: [], suffix: plain };
  const [, sign = '', digits = '', suffix = ''] = number;
  const meanings = meaningsOf(digits, decimal);
  if (meanings.length === 1 && !/\d/.test(suffix)) {
    return finish(sign, meanings[0] ?? NaN, suffix, false);
  }
  const open = meanings.length > 1 && !/\d/.test(suffix);
  return {
    ok: false,
    code: open ? 'which-decimal' : 'not-a-number',
    meanings: open ? meanings.map((one) => (sign === '-' ? -one : one)) : [],
    suffix: suffix.trim(),
  };
}

function finish(
  sign: string,
  value: number,
  suffix: string,
  fraction: boolean,
): TypedNumber | NotTyped {
  if (!Number.isFinite(value) || /\d/.test(suffix)) {
    return { ok: false, code: 'not-a-number', meanings: [], suffix };
  }
  const signed = sign === '-' ? -value : value;
  return { ok: true, value: signed, suffix: suffix.trim(), fraction };
}

/** Every number the digits and signs may stand for; one entry when there is no doubt. */
function meaningsOf(digits: string, decimal: DecimalSign): number[] {
  const signs = [...digits.matchAll(/[.,]/g)].map((found) => found[0]);
  if (signs.length === 0) return [Number(digits)];
  const whole = Number(digits.replace(/[.,]/g, ''));
  const at = Math.max(digits.lastIndexOf('.'), digits.lastIndexOf(','));
  const before = digits.slice(0, at).replace(/[.,]/g, '');
  const after = digits.slice(at + 1);
  const parted = Number(`${before || '0'}.${after || '0'}`);
  if (signs.length > 1) return [parted, whole];
  const mayBeThousands = /^[1-9]\d{0,2}$/.test(before) && after.length === 3;
  return signs[0] === decimal || !mayBeThousands ? [parted] : [parted, whole];
}
