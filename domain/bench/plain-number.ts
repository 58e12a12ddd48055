/** The sign the shop parts decimals with. */
export type DecimalSign = '.' | ',';

/**
 * A number as it stands in a sentence about a bad reading: at most four decimals, no trailing
 * zeros, a true minus. Screens format results with their own functions; this one is for sentences.
 */
export function plainNumber(value: number, decimal: DecimalSign = '.'): string {
  const digits = String(Number(Math.abs(value).toFixed(4)));
  const text = decimal === ',' ? digits.replace('.', ',') : digits;
  return value < 0 && digits !== '0' ? `−${text}` : text;
}

/** As `plainNumber` with its unit: "647.7 mm", "45 %", "17°". */
export function plainAmount(value: number, unit: string, decimal: DecimalSign = '.'): string {
  const number = plainNumber(value, decimal);
  return unit === '' || unit === '°' ? `${number}${unit}` : `${number} ${unit}`;
}
