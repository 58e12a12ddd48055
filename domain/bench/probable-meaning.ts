import type { Meant } from './bad-reading.ts';
import type { Field, Slip } from './field.ts';
import { type DecimalSign, plainAmount, plainNumber } from './plain-number.ts';
import { convert, MM_PER_INCH, type Unit } from './units.ts';

interface Given {
  number: number;
  unit: Unit;
}

/** What a number would be under one slip: how it should have been written, or null. */
type Reader = (
  given: Given,
  decimal: DecimalSign,
) => { unit: Unit; number: number; words: string }[];

const inUnit =
  (from: Unit, to: Unit): Reader =>
  ({ number, unit }, decimal) =>
    unit === from ? [{ unit: to, number, words: plainAmount(number, to, decimal) }] : [];

const swap =
  (one: Unit, other: Unit): Reader =>
  (given, decimal) => [
    ...inUnit(one, other)(given, decimal),
    ...inUnit(other, one)(given, decimal),
  ];

const divided =
  (by: number): Reader =>
  ({ number, unit }, decimal) => [
    { unit, number: number / by, words: plainAmount(number / by, unit, decimal) },
  ];

const READERS: Record<Slip, Reader> = {
  'other length': swap('mm', 'in'),
  'other temperature': swap('°C', '°F'),
  'other force': swap('N', 'lbf'),
  centimetres: inUnit('mm', 'cm'),
  thousandths: ({ number }, decimal) =>
    number >= 1
      ? [
          {
            unit: 'in',
            number: number / 1000,
            // Gauges are written without the zero in front: .011.
            words: `${plainNumber(number / 1000, decimal).replace(/^0/, '')} in`,
          },
        ]
      : [],
  '64ths': ({ number, unit }) =>
    Number.isInteger(number) && unit === 'in'
      ? [{ unit: 'in', number: number / 64, words: `${plainNumber(number)}/64 in` }]
      : [],
  'lost point': (given, decimal) => [
    ...divided(10)(given, decimal),
    ...divided(100)(given, decimal),
  ],
  fraction: ({ number, unit }, decimal) =>
    number > 0 && number <= 1
      ? [{ unit, number: number * 100, words: plainAmount(number * 100, unit, decimal) }]
      : [],
  'extra digit': ({ number, unit }, decimal) => {
    const rest = Number(String(number).slice(1));
    return [{ unit, number: rest, words: plainAmount(rest, unit, decimal) }];
  },
};

/**
 * What somebody probably meant by a number outside the range of its field: the first slip, in the
 * order of the field, that lands where readings usually lie. undefined when none does: then the
 * sentence asks for a new measurement and offers nothing.
 * @param given the number with the unit it was typed in
 */
export function probableMeaning(
  field: Field,
  given: Given,
  decimal: DecimalSign,
): Meant | undefined {
  const [low, high] = field.usual ?? [field.min, field.max];
  for (const slip of field.slips ?? []) {
    for (const candidate of READERS[slip](given, decimal)) {
      const value = convert(candidate.number, candidate.unit, field.unit);
      if (!(value >= low && value <= high)) continue;
      const kept = plainAmount(value, field.unit, decimal);
      const words =
        candidate.unit === field.unit ? candidate.words : `${candidate.words}, which is ${kept}`;
      return { value, words };
    }
  }
  return undefined;
}

/** True when one length is about 25.4 times the other: one was read in inches. */
export function looksLikeInches(one: number, other: number): boolean {
  const ratio = Math.abs(one / other);
  const near = (target: number) => Math.abs(ratio / target - 1) < 0.03;
  return near(MM_PER_INCH) || near(1 / MM_PER_INCH);
}
