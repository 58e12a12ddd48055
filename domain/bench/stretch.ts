import type { About } from './figure.ts';
import { fretPosition } from './fret-positions.ts';
import { within } from './within.ts';

export interface FrettedString {
  scaleMm: number;
  fret: number;
  /** String above the plane of the fret tops at nut and at saddle, mm. */
  nutHeightMm: number;
  saddleHeightMm: number;
  /** Plain string or core, mm: the wrap carries next to nothing. */
  coreDiameterMm: number;
  tensionN: number;
  /** Post to anchor, mm: the whole of it stretches. */
  totalLengthMm: number;
  /** GPa; steel wire 190 (materials page, read) to 207 (from memory). */
  modulusGpa?: number;
}

export interface Stretch {
  lengthChangeMm: number;
  tensionChangeN: number;
  /** Sharp by, cents. */
  cents: number;
  about: About;
}

const ABOUT_STRETCH: About = {
  formula: 'ΔL by geometry, ΔT = E A ΔL / L, cents = 600 log2(1 + ΔT/T)',
  basis: 'computed',
  source:
    'Hooke’s law; squeezing the string behind the fret is not in it: press as the player does',
};

/**
 * How much pressing a string to a fret stretches and sharpens it.
 * ΔL = √(x² + h0²) + √((S−x)² + hs²) − √(S² + (hs−h0)²), x the fret's distance from the nut.
 * @throws BadReading for an input out of range
 * Source: geometry and Hooke's law, computed; E published for A228 wire (190) or from memory (207).
 */
export function frettingStretch(string: FrettedString): Stretch {
  const { scaleMm, nutHeightMm, saddleHeightMm, tensionN, totalLengthMm } = string;
  const toFret = fretPosition(scaleMm, string.fret);
  within('stringHeight', nutHeightMm);
  within('stringHeight', saddleHeightMm);
  within('stringPull', tensionN);
  within('wholeString', totalLengthMm);
  const area = (Math.PI / 4) * within('core', string.coreDiameterMm) ** 2;
  const modulusMpa = within('modulus', string.modulusGpa ?? 200) * 1000;
  const lengthChangeMm =
    Math.hypot(toFret, nutHeightMm) +
    Math.hypot(scaleMm - toFret, saddleHeightMm) -
    Math.hypot(scaleMm, saddleHeightMm - nutHeightMm);
  const tensionChangeN = (modulusMpa * area * lengthChangeMm) / totalLengthMm;
  const cents = 600 * Math.log2(1 + tensionChangeN / tensionN);
  return { lengthChangeMm, tensionChangeN, cents, about: ABOUT_STRETCH };
}
