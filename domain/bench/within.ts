import { BadReading } from './bad-reading.ts';
import { CLIMATE_FIELDS } from './climate-fields.ts';
import type { Field } from './field.ts';
import { JOINT_FIELDS } from './joint-fields.ts';
import { type DecimalSign, plainAmount } from './plain-number.ts';
import { probableMeaning } from './probable-meaning.ts';
import { SETUP_FIELDS } from './setup-fields.ts';
import { STRING_FIELDS } from './string-fields.ts';
import type { Unit } from './units.ts';

const FIELDS = { ...STRING_FIELDS, ...SETUP_FIELDS, ...JOINT_FIELDS, ...CLIMATE_FIELDS };

export type FieldId = keyof typeof FIELDS;

/** Label, unit, accepted range, tool and its error for a reading. */
export function fieldOf(id: FieldId): Field {
  return FIELDS[id];
}

/** How a number reached the program, for the sentence that refuses it. */
export interface TypedAs {
  number: number;
  unit: Unit;
  text: string;
  decimal: DecimalSign;
}

/**
 * The value again if its field accepts it (both ends included), in the unit of the field.
 * @throws BadReading `not-a-number` for NaN and infinity, `out-of-range` otherwise, with `meant`
 *   when a usual slip explains the number.
 */
export function within(id: FieldId, value: number, typed?: TypedAs): number {
  const field = fieldOf(id);
  if (!Number.isFinite(value)) {
    throw new BadReading({
      code: 'not-a-number',
      field: id,
      sentence: `${field.label}: this is not a number. ${field.again}`,
    });
  }
  if (value >= field.min && value <= field.max) return value;
  const decimal = typed?.decimal ?? '.';
  const meant = probableMeaning(field, typed ?? { number: value, unit: field.unit }, decimal);
  const verdict = (value < field.min ? field.below : field.above) ?? field.outside;
  const advice = verdict === undefined ? field.again : `${verdict} ${field.again}`;
  const range = `${plainAmount(field.min, '', decimal)} to ${plainAmount(field.max, field.unit, decimal)}`;
  const said = typed?.text ?? plainAmount(value, field.unit);
  throw new BadReading({
    code: 'out-of-range',
    field: id,
    sentence:
      `${field.label}: ${said} is outside ${range}. ${advice}` +
      (meant ? ` Probably meant: ${meant.words}.` : ''),
    range: { min: field.min, max: field.max, unit: field.unit },
    meant,
  });
}

/**
 * As `within`, for a whole number such as a fret or a note.
 * @throws BadReading also `not-a-number` for a fraction.
 */
export function wholeWithin(id: FieldId, value: number): number {
  within(id, value);
  if (Number.isInteger(value)) return value;
  const { label, again } = fieldOf(id);
  throw new BadReading({
    code: 'not-a-number',
    field: id,
    sentence: `${label}: ${plainAmount(value, '')} is not a whole number. ${again}`,
  });
}
