import type { About } from './figure.ts';
import { within } from './within.ts';

const ABOUT_OFFSET: About = {
  formula: 'change = −1200 log2(S / (S − x))',
  basis: 'computed',
  source:
    'Only the open string is shortened; for when all low frets are sharp after the slots are at height',
};

/**
 * Cents by which every fretted note falls against the open string when the nut is moved toward
 * fret 1 by x: −1200 log2(S/(S − x)), about −1731.2 x/S.
 * @param scaleMm 200 to 1100 mm  @param offsetMm 0 to 1.5 mm
 * @throws BadReading outside these ranges
 * Source: computed.
 */
export function nutOffset(scaleMm: number, offsetMm: number): { cents: number; about: About } {
  within('scale', scaleMm);
  within('nutOffset', offsetMm);
  const cents = offsetMm === 0 ? 0 : -1200 * Math.log2(scaleMm / (scaleMm - offsetMm));
  return { cents, about: ABOUT_OFFSET };
}
