import { BadReading, type Meant } from './bad-reading.ts';
import { type DecimalSign, plainAmount } from './plain-number.ts';
import { parseTypedNumber } from './typed-number.ts';
import { unitByWord } from './unit-words.ts';
import { convert, quantityOf, type Unit } from './units.ts';
import { fieldOf, type FieldId, within } from './within.ts';

export interface ReadAs {
  /** Unit of the field on the screen, taken when none is typed. */
  unit: Unit;
  /** Sign the shop parts decimals with. */
  decimal: DecimalSign;
}

export interface Reading {
  /** In the unit of the field (mm, N, °C, %, …), unrounded. */
  value: number;
  /** As typed, trimmed. */
  typed: string;
  /** ± error of the usual tool, in the unit of the field; null when it has none of its own. */
  error: number | null;
}

/**
 * Reads what was typed into a field and tells good from bad.
 * @throws BadReading `empty`, `not-a-number`, `which-decimal`, `wrong-unit` or `out-of-range`; the
 *   sentence says what is wrong and what to do, `meant` what was probably meant.
 */
export function readReading(text: string, id: FieldId, as: ReadAs): Reading {
  const field = fieldOf(id);
  const typed = text.trim();
  const parsed = parseTypedNumber(text, as.decimal);
  const hasUnit = parsed.ok || parsed.code === 'which-decimal';
  const unit = hasUnit ? unitOf(id, parsed.suffix, as.unit, typed) : as.unit;
  if (!parsed.ok) throw refused(id, parsed.code, typed, meantOf(id, parsed.meanings, unit, as));
  if (parsed.fraction && unit === 'mm') {
    const inches = meantOf(id, [parsed.value], 'in', as);
    throw new BadReading({
      code: 'wrong-unit',
      field: id,
      sentence: `${field.label}: ${typed} is a fraction, and millimetres are written with decimals. Write in behind it for inches.`,
      meant: inches && {
        value: inches.value,
        words: `${typed.replace(/\s*mm$/, '')} in, which is ${plainAmount(inches.value, field.unit, as.decimal)}`,
      },
    });
  }
  const value = convert(parsed.value, unit, field.unit);
  const shown = parsed.suffix === '' ? `${typed}${unit === '°' ? unit : ` ${unit}`}`.trim() : typed;
  within(id, value, { number: parsed.value, unit, text: shown, decimal: as.decimal });
  return { value, typed, error: field.error };
}

function unitOf(id: FieldId, suffix: string, usual: Unit, typed: string): Unit {
  const field = fieldOf(id);
  if (suffix === '') return usual;
  const unit = unitByWord(suffix);
  if (unit !== undefined && quantityOf(unit) === quantityOf(field.unit)) return unit;
  throw new BadReading({
    code: 'wrong-unit',
    field: id,
    sentence: `${field.label}: ${typed} has ${suffix} behind the number. Type the number alone or with ${field.unit || 'no unit'}.`,
  });
}

const SENTENCES = {
  empty: () => 'nothing was typed.',
  'not-a-number': (typed: string) => `${typed} is not a number.`,
  'which-decimal': (typed: string) =>
    `${typed} can be read in two ways. Leave out the sign for thousands.`,
};

function refused(
  id: FieldId,
  code: keyof typeof SENTENCES,
  typed: string,
  meant: Meant | undefined,
): BadReading {
  const { label, again } = fieldOf(id);
  const advice = code === 'which-decimal' ? '' : ` ${again}`;
  const guess = meant ? ` Probably meant: ${meant.words}.` : '';
  const sentence = `${label}: ${SENTENCES[code](typed)}${advice}${guess}`;
  return new BadReading({ code, field: id, sentence, meant });
}

/** The one reading that its field accepts, if there is exactly one. */
function meantOf(id: FieldId, meanings: number[], unit: Unit, as: ReadAs): Meant | undefined {
  const field = fieldOf(id);
  const fitting = meanings.filter((number) => {
    const value = convert(number, unit, field.unit);
    return value >= field.min && value <= field.max;
  });
  const [only] = fitting;
  if (only === undefined || fitting.length > 1) return undefined;
  return { value: convert(only, unit, field.unit), words: plainAmount(only, unit, as.decimal) };
}
