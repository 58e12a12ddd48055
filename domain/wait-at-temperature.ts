/** What a product's label says of a wait. */
export interface LabelWait {
  /** Hours at `labelTemperature`. */
  hours: number;
  /** °C */
  labelTemperature: number;
  /** The lowest temperature the product may be used at, °C; null when the label gives none. */
  minimum: number | null;
}

/** Above this no label's figures hold, °C. */
export const WARMEST = 35;

export type WaitReckoned =
  /** `reckoned` by the rule; `used` never less than the label's hours. */
  { kind: 'wait'; reckoned: number; used: number } | { kind: 'refused'; sentence: string };

/**
 * A wait at another temperature than the label's: twice as long for each 10 °C colder,
 * t = t_label · 2^((T_label − T)/10). Common practice without a published source; follow the label.
 * Warmth never shortens the label's wait. Below the label's minimum and above 35 °C nothing is
 * reckoned: the product may not work at all.
 */
export function waitAtTemperature(label: LabelWait, temperature: number): WaitReckoned {
  const typed = `${temperature}\u00a0°C`.replace('-', '\u2212');
  if (label.minimum !== null && temperature < label.minimum)
    return {
      kind: 'refused',
      sentence: `${typed} is too cold for this product: its label says ${label.minimum}\u00a0°C or more. Warm the parts or wait.`,
    };
  if (temperature > WARMEST)
    return {
      kind: 'refused',
      sentence: `${typed} is too warm for this product. Stop, and let the parts cool below ${WARMEST}\u00a0°C.`,
    };
  const reckoned = label.hours * 2 ** ((label.labelTemperature - temperature) / 10);
  return { kind: 'wait', reckoned, used: Math.max(reckoned, label.hours) };
}
