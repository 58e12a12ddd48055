import { BadReading } from './bad-reading.ts';

/** What a number measures. Each quantity has one unit the program keeps and works in. */
export type Quantity =
  | 'length'
  | 'force'
  | 'stress'
  | 'temperature'
  | 'share'
  | 'angle'
  | 'pitch'
  | 'interval'
  | 'density'
  | 'number';

export type Unit =
  | 'mm'
  | 'cm'
  | 'in'
  | 'N'
  | 'lbf'
  | 'MPa'
  | 'kPa'
  | 'lbf/in²'
  | '°C'
  | '°F'
  | '%'
  | '°'
  | 'Hz'
  | 'cents'
  | 'kg/m³'
  | '';

interface UnitScale {
  quantity: Quantity;
  /** Kept value = typed value × factor + offset. */
  factor: number;
  offset: number;
}

/** Millimetres in an inch, exact by definition. */
export const MM_PER_INCH = 25.4;
/** Newtons in a pound-force, exact by definition (0.45359237 kg × 9.80665 m/s²). */
export const N_PER_LBF = 4.4482216152605;
/** Megapascals in a pound-force per square inch: N_PER_LBF / 25.4². */
export const MPA_PER_LBF_IN2 = N_PER_LBF / (MM_PER_INCH * MM_PER_INCH);

const UNITS: Record<Unit, UnitScale> = {
  mm: { quantity: 'length', factor: 1, offset: 0 },
  cm: { quantity: 'length', factor: 10, offset: 0 },
  in: { quantity: 'length', factor: MM_PER_INCH, offset: 0 },
  N: { quantity: 'force', factor: 1, offset: 0 },
  lbf: { quantity: 'force', factor: N_PER_LBF, offset: 0 },
  MPa: { quantity: 'stress', factor: 1, offset: 0 },
  kPa: { quantity: 'stress', factor: 0.001, offset: 0 },
  'lbf/in²': { quantity: 'stress', factor: MPA_PER_LBF_IN2, offset: 0 },
  '°C': { quantity: 'temperature', factor: 1, offset: 0 },
  '°F': { quantity: 'temperature', factor: 5 / 9, offset: -160 / 9 },
  '%': { quantity: 'share', factor: 1, offset: 0 },
  '°': { quantity: 'angle', factor: 1, offset: 0 },
  Hz: { quantity: 'pitch', factor: 1, offset: 0 },
  cents: { quantity: 'interval', factor: 1, offset: 0 },
  'kg/m³': { quantity: 'density', factor: 1, offset: 0 },
  '': { quantity: 'number', factor: 1, offset: 0 },
};

/** What a unit measures. */
export function quantityOf(unit: Unit): Quantity {
  return UNITS[unit].quantity;
}

/**
 * The same amount in another unit of the same quantity, unrounded. Inch and pound-force are exact
 * by definition (international yard and pound agreement, 1959; 9.80665 m/s²).
 * @throws BadReading `wrong-unit` when the two units measure different things.
 */
export function convert(value: number, from: Unit, to: Unit): number {
  const source = UNITS[from];
  const target = UNITS[to];
  if (source.quantity !== target.quantity) {
    throw new BadReading({
      code: 'wrong-unit',
      field: 'unit',
      sentence: `${from} cannot be turned into ${to}: one is a ${source.quantity}, the other a ${target.quantity}.`,
    });
  }
  if (from === to) return value;
  return (value * source.factor + source.offset - target.offset) / target.factor;
}
