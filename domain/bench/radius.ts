import { BadReading } from './bad-reading.ts';
import type { About } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

/** Radius of a board in mm, 35 to 600, or flat. */
export type Radius = number | 'flat';

export const ABOUT_RADIUS: About = {
  formula: 'drop = R − √(R² − y²)',
  basis: 'computed',
  source: 'Circle geometry; a radius gauge tells R to ±5 %',
};

export const ABOUT_COMPOUND: About = {
  formula: 'R(x) = R nut + (R end − R nut) x / x end',
  basis: 'common practice',
  source: 'Cone: radius in a straight line along the board, carried on to the saddle',
};

/**
 * How far the board lies lower at `offsetMm` from its centre line, mm: R − √(R² − y²); flat is 0.
 * @throws BadReading for a radius out of range, `impossible` when the offset reaches the radius
 * Source: circle geometry, computed. ±5 % as the radius.
 */
export function radiusDrop(radius: Radius, offsetMm: number): number {
  if (radius === 'flat') return 0;
  within('radius', radius);
  if (Math.abs(offsetMm) >= radius) {
    throw new BadReading({
      code: 'impossible',
      field: 'radius',
      sentence: `Fingerboard radius: offset larger than the radius, ${plainAmount(offsetMm, 'mm')} against ${plainAmount(radius, 'mm')}. Measure both again.`,
    });
  }
  // y²/(R + √…) is the same drop without losing digits on nearly flat boards.
  return offsetMm ** 2 / (radius + Math.sqrt(radius ** 2 - offsetMm ** 2));
}

/**
 * Radius in mm from a sag s under a straightedge of width w: s/2 + w²/(8 s). A sag of 0 is flat.
 * @throws BadReading `out-of-range` for a radius no board has, or a width that is not positive
 * Source: circle geometry, computed. A sag read to ±0.02 mm under 50 mm is ±2 % at R 304.8.
 */
export function radiusFromSag(sagMm: number, widthMm: number): Radius {
  within('jointSize', widthMm);
  if (sagMm === 0) return 'flat';
  return within('radius', sagMm / 2 + widthMm ** 2 / (8 * sagMm));
}

/**
 * Radius of a compound board at x mm from the nut, also beyond its end (at the saddle):
 * R nut + (R end − R nut) x / x end.
 * @throws BadReading for radii out of range, a board that ends at the nut, or an x where no radius is left
 * Source: common practice; a cone's radius changes in a straight line.
 */
export function compoundRadius(
  nutMm: number,
  endMm: number,
  endXMm: number,
  xMm: number,
): { radiusMm: number; about: About } {
  within('radius', nutMm);
  within('radius', endMm);
  within('boardLength', endXMm);
  within('alongBoard', xMm);
  const radiusMm = nutMm + ((endMm - nutMm) * xMm) / endXMm;
  return { radiusMm: within('saddleRadius', radiusMm), about: ABOUT_COMPOUND };
}

export interface SaddleArc {
  boardRadius: Radius;
  /** Strings from the centre line at the saddle, mm, bass side first. */
  offsetsMm: readonly number[];
  /** String over the board's surface at the saddle, first and last string, mm. */
  firstMm: number;
  lastMm: number;
}

/**
 * Height of every string at the saddle above the plane touching the board's crown there, mm: the wish
 * over the board, from first to last in a straight line (the tilt), less the drop of the board (the arc).
 * @throws BadReading for an input out of range or fewer than two strings
 * Source: strings on an arc parallel to the board, geometry, computed.
 */
export function saddleArc({ boardRadius, offsetsMm, firstMm, lastMm }: SaddleArc): number[] {
  within('stringHeight', firstMm);
  within('stringHeight', lastMm);
  const from = offsetsMm[0];
  const to = offsetsMm.at(-1);
  if (from === undefined || to === undefined || from === to) {
    throw new BadReading({
      code: 'impossible',
      field: 'offsets',
      sentence:
        'Saddle: an arc needs at least two strings in different places. Enter each string’s distance from the centre line.',
    });
  }
  return offsetsMm.map((offset) => {
    const wish = firstMm + ((lastMm - firstMm) * (offset - from)) / (to - from);
    return wish - radiusDrop(boardRadius, offset);
  });
}
