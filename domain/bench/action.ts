import { BadReading } from './bad-reading.ts';
import type { About } from './figure.ts';
import { fretPosition } from './fret-positions.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

const ABOUT_ACTION: About = {
  formula: 'saddle change = action change × (S + c) / x_n',
  basis: 'computed',
  source: 'Similar triangles along the string; twice at the 12th fret is common practice',
};

/** A saddle should stand at least this far proud of its bridge, mm: common practice. */
export const LEAST_SADDLE_MM = 1;

export interface SaddleChange {
  /** How much to add to (plus) or take off (minus) the saddle, mm. */
  changeMm: number;
  /** What stands proud afterwards, mm; null when it was not given. */
  proudAfterMm: number | null;
  about: About;
}

export interface ActionChange {
  scaleMm: number;
  /** Saddle further than the scale length, mm. */
  compensationMm?: number;
  /** Where the action was read; usually 12. */
  fret?: number;
  /** Target less present, mm; lower is minus. */
  changeMm: number;
  /** Saddle standing proud now, mm. */
  saddleProudMm?: number;
}

/**
 * Change of saddle height for a change of action at a fret: d (S + c)/x_n; at the 12th 2 + 2c/S
 * times, about twice.
 * @throws BadReading for an input out of range; `impossible` when less than 1 mm of saddle would
 *   stand proud: then the neck angle is the matter
 * Source: similar triangles, computed. Error: twice that of the action reading.
 */
export function saddleChange(input: ActionChange): SaddleChange {
  const compensationMm = within('compensation', input.compensationMm ?? 0);
  const toFret = fretPosition(input.scaleMm, input.fret ?? 12);
  within('actionChange', input.changeMm);
  const changeMm = (input.changeMm * (input.scaleMm + compensationMm)) / toFret;
  if (input.saddleProudMm === undefined) {
    return { changeMm, proudAfterMm: null, about: ABOUT_ACTION };
  }
  const proudAfterMm = within('saddleProud', input.saddleProudMm) + changeMm;
  if (changeMm < 0 && proudAfterMm < LEAST_SADDLE_MM) {
    throw new BadReading({
      code: 'impossible',
      field: 'saddleProud',
      sentence: `Saddle: taking off ${plainAmount(-changeMm, 'mm')} would leave ${plainAmount(Math.max(proudAfterMm, 0), 'mm')} proud, and ${LEAST_SADDLE_MM} mm is the least. Not enough saddle: look at the neck angle.`,
    });
  }
  return { changeMm, proudAfterMm, about: ABOUT_ACTION };
}
