import { type HeadSide, sideBreakAngle } from './break-angle.ts';
import type { About } from './figure.ts';
import { within } from './within.ts';

const RAD = Math.PI / 180;

/** Forces on a section square to the neck, from the string pull. */
export interface SectionForces {
  /** Along the neck, pressing the section together, N. */
  axialN: number;
  /** Across the neck, N. */
  shearN: number;
  /** Turning moment about the middle of the section, N m; opens the back of the neck. */
  momentNm: number;
}

export interface HeadstockSection {
  breakAngleDeg: number;
  /** Cut just headstock-side of the nut: the nut stays with the neck. */
  beyondNut: SectionForces;
  /** Cut behind the nut: the nut goes with the headstock, and its reaction cancels the shear. */
  behindNut: SectionForces;
  /** T sin(angle) × distance to the posts, N m: the face-normal load, not the joint moment. */
  faceNormalNm: number;
  about: About;
}

const ABOUT_SECTION: About = {
  formula:
    'N = T cos φ, V = T sin φ, M = T cos φ × string to middle; behind the nut N = T, M = T e',
  basis: 'computed',
  source: 'Statics of a cut section; ±1 mm in the distance of the string is ±8 % of the moment',
};

/**
 * Forces where the neck is cut between nut and first post, the usual place of a break: N = T cos φ
 * (compression), V = T sin φ, M = T cos φ × h, h the string above the middle of that section.
 * @param pullN of all strings, 1 to 5000 N  @param breakAngleDeg φ from the side, 0 to 45°
 * @param stringToMiddleMm h at the place of the cut, square to the neck, 5 to 25 mm
 * @throws BadReading outside these ranges
 * Source: statics, computed. The rough part is h: ±1 mm is ±8 %.
 */
export function forcesBeyondNut(
  pullN: number,
  breakAngleDeg: number,
  stringToMiddleMm: number,
): SectionForces {
  within('totalPull', pullN);
  const angle = within('breakAngle', breakAngleDeg) * RAD;
  within('stringToMiddle', stringToMiddleMm);
  const axialN = pullN * Math.cos(angle);
  return {
    axialN,
    shearN: pullN * Math.sin(angle),
    momentNm: (axialN * stringToMiddleMm) / 1000,
  };
}

/**
 * Forces where the neck is cut behind the nut: N = T, V ≈ 0, M = T e. The slope of the string down
 * to the nut is left out.
 * @param stringToMiddleMm e, slot bottom above the middle of the section, 5 to 25 mm
 * @throws BadReading outside these ranges
 */
export function forcesBehindNut(pullN: number, stringToMiddleMm: number): SectionForces {
  within('totalPull', pullN);
  within('stringToMiddle', stringToMiddleMm);
  return { axialN: pullN, shearN: 0, momentNm: (pullN * stringToMiddleMm) / 1000 };
}

/**
 * Both cuts at the nut for posts at one distance; posts at several: string by string, and add.
 * @param pullN T, all strings  @param head see HeadSide  @param slotToMiddleMm e, slot bottom above
 *   the middle of the section, 5 to 25 mm
 * @throws BadReading for an input out of range
 * Source: statics, computed; checked with vector products.
 */
export function headstockSection(
  pullN: number,
  head: HeadSide,
  slotToMiddleMm: number,
): HeadstockSection {
  const breakAngleDeg = sideBreakAngle(head);
  return {
    breakAngleDeg,
    beyondNut: forcesBeyondNut(pullN, breakAngleDeg, slotToMiddleMm),
    behindNut: forcesBehindNut(pullN, slotToMiddleMm),
    faceNormalNm: (pullN * Math.sin(head.headstockAngleDeg * RAD) * head.slotToPostMm) / 1000,
    about: ABOUT_SECTION,
  };
}
