import currencies from 'currency-codes';

/** An amount in whole minor units (pence, cents) of an ISO 4217 currency. */
export interface Money {
  minor: bigint;
  currency: string;
}

/** The most a price may be: 10^12 minor units. */
export const MOST_MINOR = 1_000_000_000_000n;

/**
 * How many decimals a currency has. From the ISO 4217 list one, not from Intl: Intl follows use, and
 * says 0 for HUF where the standard says 2. Throws RangeError for a code that is not on the list.
 */
export function minorUnitDigits(currency: string): number {
  const found = currencies.code(currency);
  if (!found) throw new RangeError(`${currency} is not a currency of ISO 4217.`);
  return found.digits;
}

/** The amount as plain digits with a decimal point, without sign of the currency: "616.80", "500". */
export function decimalAmount({ minor, currency }: Money): string {
  const digits = minorUnitDigits(currency);
  const text = (minor < 0n ? -minor : minor).toString().padStart(digits + 1, '0');
  const cut = text.length - digits;
  const shown = digits === 0 ? text : `${text.slice(0, cut)}.${text.slice(cut)}`;
  return minor < 0n ? `-${shown}` : shown;
}

/** A typed amount read into minor units, or the sentence that says what is wrong with it. */
export type AmountRead = { minor: bigint } | { sentence: string };

/**
 * Reads an amount as typed: point or comma for the decimals, blanks between thousands. "1,200" could
 * be either, so it is asked, never guessed. Never goes through a float.
 */
export function readAmount(text: string, currency: string): AmountRead {
  const digits = minorUnitDigits(currency);
  const typed = text.trim().replace(/[\u00a0\u202f ]/g, '');
  const [, whole, decimals = ''] = /^(\d+)(?:[.,](\d+))?$/.exec(typed) ?? [];
  if (whole === undefined)
    return { sentence: `“${text.trim()}” is no amount. Write it as ${example(digits)}.` };
  if (/^\d{1,3},\d{3}$/.test(typed) && digits !== 3)
    return {
      sentence: `“${typed}” may be thousands or decimals. Write it without the comma.`,
    };
  if (decimals.length > digits)
    return {
      sentence: `${currency} has ${digits === 0 ? 'no decimals' : `${digits} decimals`}; “${typed}” has more. Write it as ${example(digits)}.`,
    };
  const minor = BigInt(whole + decimals.padEnd(digits, '0'));
  return minor > MOST_MINOR
    ? { sentence: `“${typed}” is more than can be billed here. Check the figure.` }
    : { minor };
}

const example = (digits: number) => (digits === 0 ? '1200' : `1200.${'5'.padEnd(digits, '0')}`);
