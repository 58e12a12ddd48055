import { within } from './within.ts';

/**
 * Bending stress in MPa at the outer fibre of a rectangle: σ = 6 M / (b t²).
 * @param momentNm 0 to 200 N m  @param widthMm b, across  @param thicknessMm t, in the direction of bending
 * @throws BadReading for an input out of range
 * Source: bending of a beam, computed. For information: a neck is no rectangle.
 */
export function bendingStress(momentNm: number, widthMm: number, thicknessMm: number): number {
  within('moment', momentNm);
  within('jointSize', widthMm);
  within('jointSize', thicknessMm);
  return (6 * momentNm * 1000) / (widthMm * thicknessMm ** 2);
}
