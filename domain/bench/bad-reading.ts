import { Invalid } from '../errors.ts';

export type BadReadingCode =
  /** Nothing was typed. */
  | 'empty'
  /** Text, NaN or infinity. */
  | 'not-a-number'
  /** A comma or point that may part decimals or thousands. */
  | 'which-decimal'
  /** A unit of another quantity. */
  | 'wrong-unit'
  /** A number outside what is accepted for its field. */
  | 'out-of-range'
  /** Numbers that are fine alone but cannot be true together. */
  | 'impossible'
  /** A reading taken before what it depends on was settled. */
  | 'too-early';

/** What was probably meant, in the unit the program keeps. */
export interface Meant {
  value: number;
  /** For the screen: ".011 in, which is 0.279 mm". */
  words: string;
}

export interface BadReadingFacts {
  code: BadReadingCode;
  /** Id of the field, as in FIELDS, or the name of the group of inputs that disagree. */
  field: string;
  /** What is wrong, then what to do. */
  sentence: string;
  range?: { min: number; max: number; unit: string };
  meant?: Meant;
}

/**
 * A reading that cannot be used. The sentence names the field, what was typed, what is accepted and
 * what to measure again.
 */
export class BadReading extends Invalid {
  override readonly code: BadReadingCode;
  readonly field: string;
  readonly range: BadReadingFacts['range'];
  readonly meant: Meant | undefined;

  constructor(facts: BadReadingFacts) {
    super({ [facts.field]: facts.sentence });
    this.code = facts.code;
    this.field = facts.field;
    this.range = facts.range;
    this.meant = facts.meant;
  }
}

/**
 * Runs a calculation for one of several alike (a string, a course) and, if its input is refused,
 * says which one: `strings.2.scale`, "String 3. Scale length: …".
 * @throws BadReading as the calculation does, with the place in front.
 */
export function inPlace<T>(group: string, index: number, name: string, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof BadReading)) throw error;
    throw new BadReading({
      code: error.code,
      field: `${group}.${index}.${error.field}`,
      sentence: `${name}. ${error.sentence}`,
      range: error.range,
      meant: error.meant,
    });
  }
}
