import type { About } from './figure.ts';
import { wholeWithin, within } from './within.ts';

export const ABOUT_FRETS: About = {
  formula: 'd = S (1 − 2^(−n/12))',
  basis: 'computed',
  source:
    'Twelve equal semitones; the same as removing 1/17.81715 of the rest each time (common practice)',
};

/** Acceptance of a cut fret slot at the bench, ± mm: common practice. */
export const FRET_TOLERANCE_MM = 0.1;

export interface FretPosition {
  fret: number;
  /** From the front edge of the nut, mm. */
  fromNutMm: number;
  /** From the fret before, or the nut, mm. */
  spaceMm: number;
}

/**
 * Distance in mm from the front edge of the nut to a fret: d = S (1 − 2^(−n/12)).
 * @param scaleMm nominal scale length, 200 to 1100 mm (not nut to saddle)
 * @param fret 1 to 36, whole
 * @throws BadReading outside these ranges
 * Source: twelve equal semitones, computed. Exact; S is known to ±0.3 mm by rule, and so is d in
 * proportion.
 */
export function fretPosition(scaleMm: number, fret: number): number {
  within('scale', scaleMm);
  wholeWithin('fret', fret);
  return scaleMm * (1 - 2 ** (-fret / 12));
}

/** All frets from 1 to `count`, each from the nut: measuring from fret to fret adds up the errors. */
export function fretPositions(scaleMm: number, count: number): FretPosition[] {
  wholeWithin('fret', count);
  const positions: FretPosition[] = [];
  for (let fret = 1; fret <= count; fret += 1) {
    const fromNutMm = fretPosition(scaleMm, fret);
    positions.push({ fret, fromNutMm, spaceMm: fromNutMm - (positions.at(-1)?.fromNutMm ?? 0) });
  }
  return positions;
}
