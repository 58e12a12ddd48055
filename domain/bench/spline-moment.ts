import { BadReading } from './bad-reading.ts';
import type { About } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { type Splines, splineStress } from './spline.ts';
import { within } from './within.ts';

const ABOUT_MOMENT: About = {
  formula: 'F = M / z, z = d − x/3, w x²/2 = n As (d − x)',
  basis: 'computed',
  source:
    'Model: the break carries no tension, the splines alone hold the back and the wood in front is pressed, as if there were no pull along the neck; no published source for necks',
};

export interface SplineMoment {
  /** Pull in all splines together, N. */
  forceN: number;
  /** Between the splines and the middle of the pressed wood, mm. */
  leverMm: number;
  /** How deep the wood in front is pressed, mm. */
  pressedMm: number;
  workingAreaMm2: number;
  /** On the glue of the working area, MPa. */
  averageShearMpa: number;
  about: About;
}

/**
 * What splines let in from the back bear if they alone hold the turning moment: the break opens at the
 * back, the wood in front is pressed in a triangle x deep, the splines pull F at their middle
 * d = t − h/2 from the front. w x²/2 = n As (d − x), F = M/(d − x/3), shear F over the glued area of
 * the shorter side.
 * The pull along the neck, which presses the break together, is not taken off: real shear is smaller.
 * @param momentNm 0 to 200 N m  @param widthMm w, section across  @param thicknessMm t, section through
 * @param stiffness spline against neck wood along the grain; 1 when both are alike
 * @throws BadReading for a size out of range; `impossible` when the splines do not fit the section
 * Source: cracked section as in reinforced beams, computed.
 */
export function splineMoment(
  splines: Splines,
  momentNm: number,
  widthMm: number,
  thicknessMm: number,
  stiffness = 1,
): SplineMoment {
  within('moment', momentNm);
  within('jointSize', widthMm);
  within('jointSize', thicknessMm);
  within('stiffnessRatio', stiffness);
  const { count, depthMm } = splines;
  const area = count * splines.widthMm * depthMm;
  if (depthMm >= thicknessMm || count * splines.widthMm >= widthMm) {
    throw new BadReading({
      code: 'impossible',
      field: 'splines',
      sentence: `Splines: ${plainAmount(count, '')} of ${plainAmount(splines.widthMm, 'mm')} by ${plainAmount(depthMm, 'mm')} do not fit a neck of ${plainAmount(widthMm, 'mm')} by ${plainAmount(thicknessMm, 'mm')}. Check the sizes.`,
    });
  }
  const splineAtMm = thicknessMm - depthMm / 2;
  const ratio = (stiffness * area) / widthMm;
  const pressedMm = Math.sqrt(ratio ** 2 + 2 * ratio * splineAtMm) - ratio;
  const leverMm = splineAtMm - pressedMm / 3;
  const forceN = (momentNm * 1000) / leverMm;
  const { workingAreaMm2, averageShearMpa } = splineStress(splines, forceN);
  return { forceN, leverMm, pressedMm, workingAreaMm2, averageShearMpa, about: ABOUT_MOMENT };
}
