import { money } from '../format/money.ts';

/** "£616.80" of a total as the database keeps it: digits of minor units, and the currency's code. */
export function moneyOf({
  totalMinor,
  currency,
}: {
  totalMinor: string;
  currency: string;
}): string {
  return money({ minor: BigInt(totalMinor), currency });
}
