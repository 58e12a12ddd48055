import { decimalAmount, minorUnitDigits, type Money } from '#domain/money.ts';

const MINUS = '\u2212';

/**
 * An amount for people: "£346.00", "−£150.00", "¥500". Exact for any size: the digits go to Intl as
 * text. For loaders only: the list of currencies is large.
 */
export function money({ minor, currency }: Money): string {
  const digits = minorUnitDigits(currency);
  const text = decimalAmount({ minor: minor < 0n ? -minor : minor, currency });
  const shown = new Intl.NumberFormat('en-GB', {
    style: 'currency',
    currency,
    currencyDisplay: 'narrowSymbol',
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  }).format(text as `${number}`);
  return minor < 0n ? `${MINUS}${shown}` : shown;
}
