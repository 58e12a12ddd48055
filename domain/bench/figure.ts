/**
 * What every worked-out figure carries beside its value, so that a screen can always say how
 * it was found, how far it can be trusted and whether anybody published it.
 */

/**
 * Where a formula or a default comes from. `published`: read in the named source. `computed`:
 * follows from geometry or statics and was checked by a second method. `common practice`: a trade
 * rule nobody published. `from memory`: a figure remembered, to be confirmed before it is quoted.
 */
export type Basis = 'published' | 'computed' | 'common practice' | 'from memory';

/** Name of the formula, where it comes from and what kind of source that is. */
export interface About {
  formula: string;
  basis: Basis;
  source: string;
}

/** Lowest and highest value the figure may have, in the unit of the figure. */
export interface Band {
  low: number;
  high: number;
}

/** Something a repairer should know beside a figure that could still be worked out. */
export interface Warning {
  code: string;
  sentence: string;
}

/** Band of ± `share` (0.05 is 5 %) round a value; a negative value keeps low below high. */
export function bandByShare(value: number, share: number): Band {
  return bandByAmount(value, Math.abs(value) * share);
}

/** Band of ± `amount`, in the unit of the value. */
export function bandByAmount(value: number, amount: number): Band {
  return { low: value - amount, high: value + amount };
}
