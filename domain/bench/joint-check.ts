import type { Basis } from './figure.ts';
import { forcesBehindNut, forcesBeyondNut, type SectionForces } from './headstock-section.ts';
import { scarfAngle, type ScarfStress, scarfStress } from './scarf.ts';
import type { Splines } from './spline.ts';
import { type SplineMoment, splineMoment } from './spline-moment.ts';
import { type ShearWood, strengthRatio, WOOD_SHEAR } from './wood-strength.ts';

export interface JointCheckInput {
  /** Pull of all strings, N. */
  pullN: number;
  /** Between nut and first post, the usual place, or behind the nut. */
  place: 'beyond nut' | 'behind nut';
  /** Of the string at the nut, from the side; counts beyond the nut only. */
  breakAngleDeg: number;
  /** String above the middle of the section there, mm. */
  stringToMiddleMm: number;
  /** Section at the break, across and through, mm. */
  widthMm: number;
  thicknessMm: number;
  /** How far the break runs along the neck, mm. */
  breakLengthMm: number;
  wood: ShearWood;
  /** From the back; null for the break glued alone. */
  splines: Splines | null;
}

export interface JointCheck {
  forces: SectionForces;
  slantDeg: number;
  alone: ScarfStress & { ratio: number };
  splined: (SplineMoment & { ratio: number }) | null;
  strength: { name: string; shearMpa: number; basis: Basis; source: string };
}

/**
 * A glued break under string pull, alone and with splines: section forces, glue area, average and
 * largest shear, bending, opening, and the wood's shear strength as a ratio on the largest shear.
 * It reports figures; the cautions of CAUTIONS at 'joint check' are always shown with them.
 * @throws BadReading for an input out of range or sizes that do not fit together
 * Source: statics, computed, over a published or remembered strength (its basis is in `strength`).
 */
export function jointCheck(input: JointCheckInput): JointCheck {
  const { widthMm, thicknessMm } = input;
  const strength = WOOD_SHEAR[input.wood];
  const forces =
    input.place === 'behind nut'
      ? forcesBehindNut(input.pullN, input.stringToMiddleMm)
      : forcesBeyondNut(input.pullN, input.breakAngleDeg, input.stringToMiddleMm);
  const slantDeg = scarfAngle(thicknessMm, input.breakLengthMm);
  const alone = scarfStress({ widthMm, thicknessMm, faceAngleDeg: slantDeg }, forces);
  const ratioOn = (shearMpa: number) => strengthRatio(strength.shearMpa, shearMpa).ratio;
  const splined =
    input.splines && splineMoment(input.splines, forces.momentNm, widthMm, thicknessMm);
  return {
    forces,
    slantDeg,
    alone: { ...alone, ratio: ratioOn(alone.largestShearMpa) },
    splined: splined && { ...splined, ratio: ratioOn(splined.averageShearMpa) },
    strength,
  };
}
