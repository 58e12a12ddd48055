import { bendingStress } from './bending.ts';
import type { About } from './figure.ts';
import type { SectionForces } from './headstock-section.ts';
import { within } from './within.ts';

const RAD = Math.PI / 180;

const ABOUT_SCARF: About = {
  formula:
    'A = w t / sin b; τ = |N cos b + V sin b| / A; bending σ on the face: σ sin b cos b, σ sin² b',
  basis: 'computed',
  source: 'Section forces resolved on the slanting face; elementary statics',
};

/** A slanting joint through the whole section: a scarf or a break glued alone. */
export interface ScarfFace {
  /** Section across and through, mm. */
  widthMm: number;
  thicknessMm: number;
  /** Slant of the face to the neck, 2 to 90°. */
  faceAngleDeg: number;
}

export interface ScarfStress {
  areaMm2: number;
  /** Average shear along the face, MPa. */
  averageShearMpa: number;
  /** Average across the face, MPa; pressing together is plus. */
  averageNormalMpa: number;
  /** At the outer fibre of the section, MPa. */
  bendingMpa: number;
  /** Average plus what bending adds along the face, MPa: what the ratio is taken on. */
  largestShearMpa: number;
  /**
   * Pulling the face open at the back, from bending alone, MPa. The pull presses the face together by
   * `averageNormalMpa`; that is not taken off. There is no ratio for it: no source for glue in peel.
   */
  openingMpa: number;
  about: About;
}

/**
 * Slant in degrees of a joint or break that runs `lengthMm` along the neck: atan(t / length).
 * @throws BadReading for a size out of range
 */
export function scarfAngle(thicknessMm: number, lengthMm: number): number {
  within('jointSize', thicknessMm);
  within('jointSize', lengthMm);
  return Math.atan2(thicknessMm, lengthMm) / RAD;
}

/**
 * Stresses on a slanting glued face, b its angle to the neck: A = w t / sin b,
 * τ = |N cos b + V sin b| / A, normal (N sin b − V cos b) / A, bending σ = 6M/(w t²) giving
 * σ sin b cos b along and σ sin² b across the face.
 * @throws BadReading for a size or force out of range
 * Source: statics, computed. Bending is the main load, not average shear. Averages say nothing of the
 * peaks at the ends; see the cautions of a joint check.
 */
export function scarfStress(face: ScarfFace, forces: SectionForces): ScarfStress {
  const { widthMm, thicknessMm } = face;
  const angle = within('faceAngle', face.faceAngleDeg) * RAD;
  within('jointForce', forces.axialN);
  within('sectionForce', forces.shearN);
  const bendingMpa = bendingStress(forces.momentNm, widthMm, thicknessMm);
  const sin = Math.sin(angle);
  const cos = Math.cos(angle);
  const areaMm2 = (widthMm * thicknessMm) / sin;
  const averageShearMpa = Math.abs(forces.axialN * cos + forces.shearN * sin) / areaMm2;
  return {
    areaMm2,
    averageShearMpa,
    averageNormalMpa: (forces.axialN * sin - forces.shearN * cos) / areaMm2,
    bendingMpa,
    largestShearMpa: averageShearMpa + bendingMpa * sin * cos,
    openingMpa: bendingMpa * sin ** 2,
    about: ABOUT_SCARF,
  };
}
