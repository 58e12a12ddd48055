const MINUS = '\u2212';

/**
 * An amount in minor units of an ISO 4217 currency: `money(34600, 'GBP')` is "£346.00",
 * `money(500, 'JPY')` is "¥500". Exact for any size: no float is made on the way.
 */
export function money(minor: bigint | number | string, currency: string): string {
  const format = new Intl.NumberFormat('en-GB', {
    style: 'currency',
    currency,
    currencyDisplay: 'narrowSymbol',
  });
  const amount = BigInt(minor);
  const digits = format.resolvedOptions().maximumFractionDigits ?? 2;
  const text = (amount < 0n ? -amount : amount).toString().padStart(digits + 1, '0');
  const whole = text.slice(0, text.length - digits);
  const shown = format
    .formatToParts(BigInt(whole))
    .map((part) => (part.type === 'fraction' ? text.slice(-digits) : part.value))
    .join('');
  return amount < 0n ? `${MINUS}${shown}` : shown;
}
