import type { Unit } from './units.ts';

/** One thing that is measured or chosen at the bench. */
export interface Field {
  /** As it begins a sentence: "Scale length". */
  label: string;
  /** Unit it is kept and worked with. */
  unit: Unit;
  /** Accepted, both ends included. */
  min: number;
  max: number;
  /** Where most readings lie; decides which of several probable meanings is offered. */
  usual?: readonly [number, number];
  /** Instrument it is read with. */
  tool: string;
  /** Typical error of that instrument, ±, in the unit of the field; null where a share or none. */
  error: number | null;
  /** What to do after a refusal: what to measure or choose again. */
  again: string;
  /** What is wrong with a number outside the range; below or above it where that differs. */
  outside?: string;
  below?: string;
  above?: string;
  /** Some ways a number for this field goes wrong; see probable-meaning.ts. */
  slips?: readonly Slip[];
}

/** A habit of writing that explains a number outside its range. */
export type Slip =
  /** The other unit of length: inches for millimetres or the reverse. */
  | 'other length'
  /** Centimetres for millimetres. */
  | 'centimetres'
  /** String gauges are spoken as thousandths of an inch: "an eleven". */
  | 'thousandths'
  /** Actions are spoken as 64ths of an inch: "five at the twelfth". */
  | '64ths'
  /** A decimal point left out. */
  | 'lost point'
  /** A fraction for a percentage: 0.45. */
  | 'fraction'
  /** A key too many in front: 145 for 45. */
  | 'extra digit'
  /** Degrees Fahrenheit for Celsius or the reverse. */
  | 'other temperature'
  /** Pound-force for newtons or the reverse. */
  | 'other force';
