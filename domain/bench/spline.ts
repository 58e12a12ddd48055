import { BadReading } from './bad-reading.ts';
import type { About } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { wholeWithin, within } from './within.ts';

/** Splines let in along the neck across a break, from the back. */
export interface Splines {
  count: number;
  lengthMm: number;
  widthMm: number;
  /** Into the neck, mm. */
  depthMm: number;
  /** Length on the shorter side of the break, mm; half the length when it is centred. */
  shorterSideMm?: number;
}

export interface SplineStress {
  /** Floors and two walls, whole length, mm²; end grain is not counted. */
  gluedAreaMm2: number;
  /** On the shorter side of the break: the load passes from head to spline to neck. */
  workingAreaMm2: number;
  /** Force over the whole glued area, MPa; kept beside it, not what the joint bears. */
  shearOverGluedMpa: number;
  /** Force over the working area, MPa. */
  averageShearMpa: number;
  about: About;
}

const ABOUT_SPLINE: About = {
  formula: 'A = n L (w + 2h); τ = F / A on the shorter side of the break',
  basis: 'computed',
  source: 'Geometry of a groove, floor and two walls; an average without the peaks at the ends',
};

/**
 * Glued area of splines and the average shear a force along them makes: A = n L (w + 2h), τ = F/A.
 * The area that works is that of the shorter side of the break.
 * @param forceN along the splines, 0 to 5000 N
 * @throws BadReading for a size out of range; `impossible` when the shorter side is over half the length
 * Source: geometry, computed.
 */
export function splineStress(splines: Splines, forceN: number): SplineStress {
  const { count, lengthMm } = splines;
  wholeWithin('splineCount', count);
  within('jointSize', lengthMm);
  const edgeMm = within('jointSize', splines.widthMm) + 2 * within('jointSize', splines.depthMm);
  within('jointForce', forceN);
  const sideMm = splines.shorterSideMm ?? lengthMm / 2;
  if (!(sideMm > 0 && sideMm <= lengthMm / 2)) {
    throw new BadReading({
      code: 'impossible',
      field: 'shorterSide',
      sentence: `Spline: ${plainAmount(sideMm, 'mm')} cannot be the shorter side of ${plainAmount(lengthMm, 'mm')}. Measure from the break to the nearer end.`,
    });
  }
  const gluedAreaMm2 = count * lengthMm * edgeMm;
  const workingAreaMm2 = count * sideMm * edgeMm;
  return {
    gluedAreaMm2,
    workingAreaMm2,
    shearOverGluedMpa: forceN / gluedAreaMm2,
    averageShearMpa: forceN / workingAreaMm2,
    about: ABOUT_SPLINE,
  };
}
