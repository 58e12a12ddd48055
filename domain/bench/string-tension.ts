import { within } from './within.ts';

/** Sounding length and pitch of a string. */
export interface Sounding {
  /** Scale length of this string, 200 to 1100 mm. */
  scaleMm: number;
  /** Pitch of the open string, Hz. */
  frequencyHz: number;
}

/**
 * Pull in N of an ideal flexible string: T = μ (2 L f)², L in metres.
 * @param massPerLengthKgM kg per metre
 * @throws BadReading for a scale or pitch out of range
 * Source: f = (1/2L) √(T/μ), computed. Stiffness and the pull at the post differ by less than the
 * band the callers print.
 */
export function tensionOf(massPerLengthKgM: number, { scaleMm, frequencyHz }: Sounding): number {
  within('scale', scaleMm);
  within('pitch', frequencyHz);
  return massPerLengthKgM * ((2 * scaleMm * frequencyHz) / 1000) ** 2;
}

/**
 * Pull in N after the pitch is changed by `cents` at one length: T follows the square of the
 * frequency, so T × 2^(cents/600); one semitone down is −10.9 %.
 * Source: T = μ (2 L f)², computed.
 */
export function tensionAtPitchChange(tensionN: number, cents: number): number {
  return tensionN * 2 ** (cents / 600);
}
