import { BadReading } from './bad-reading.ts';
import { type About, type Band, bandByAmount } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { wholeWithin, within } from './within.ts';

export const ABOUT_PITCH: About = {
  formula: 'f = A4 × 2^((n − 69)/12)',
  basis: 'computed',
  source: 'Twelve equal semitones; A4 = 440 Hz is ISO 16 (from memory)',
};

export const ABOUT_CENTS: About = {
  formula: 'cents = 1200 log2(measured / reference)',
  basis: 'computed',
  source: 'Definition: 1200 cents to the octave',
};

/** ± cents of an ordinary and of a strobe tuner: common practice. */
export const TUNER_ERROR_CENTS = { ordinary: 1, strobe: 0.1 } as const;
export type Tuner = keyof typeof TUNER_ERROR_CENTS;

/**
 * Frequency in Hz of a note: f = A4 × 2^((n − 69)/12).
 * @param note MIDI note number, 0 to 127, whole; A4 is 69
 * @param a4Hz the shop's reference, 380 to 480 Hz
 * @throws BadReading outside these ranges
 * Source: twelve equal semitones, computed; 440 Hz as ISO 16, from memory.
 */
export function noteFrequency(note: number, a4Hz = 440): number {
  wholeWithin('note', note);
  within('a4', a4Hz);
  return a4Hz * 2 ** ((note - 69) / 12);
}

const STEPS: Record<string, number> = { C: 0, D: 2, E: 4, F: 5, G: 7, A: 9, B: 11 };
const SHIFTS: Record<string, number> = { '': 0, '#': 1, '♯': 1, b: -1, '♭': -1 };

/**
 * MIDI note number of a name in scientific pitch notation: "A4" is 69, "Bb2" 46, "F♯3" 54.
 * @throws BadReading when it is no such name or lies outside 0 to 127.
 * Source: convention, C4 = 60; computed.
 */
export function noteNumber(name: string): number {
  const found = /^([A-Ga-g])([#♯b♭]?)(-?\d)$/.exec(name.trim().replace('−', '-'));
  const step = STEPS[found?.[1]?.toUpperCase() ?? ''];
  const shift = SHIFTS[found?.[2] ?? ''];
  if (found === null || step === undefined || shift === undefined) {
    throw new BadReading({
      code: 'not-a-number',
      field: 'note',
      sentence: `Note: ${name.trim() || 'nothing'} is not a note name. Write the letter, # or b, and the octave: E2, F#3, Bb2.`,
    });
  }
  return wholeWithin('note', 12 * (Number(found[3]) + 1) + step + shift);
}

/**
 * Distance in cents from a reference pitch to a measured one, both in Hz; above is plus.
 * cents = 1200 log2(measured / reference).
 * @throws BadReading for a pitch of 0 Hz or less, or outside 10 to 5000 Hz.
 * Source: definition, computed.
 */
export function centsBetween(referenceHz: number, measuredHz: number): number {
  within('pitch', referenceHz);
  within('pitch', measuredHz);
  return 1200 * Math.log2(measuredHz / referenceHz);
}

/**
 * How far a string is out of tune, in cents, with the error of the tuner as band.
 * @throws BadReading as `centsBetween`, and `impossible` when it is more than half an octave off:
 *   then the note or the octave was named wrongly.
 */
export function tuningError(
  referenceHz: number,
  measuredHz: number,
  tuner: Tuner = 'ordinary',
): { cents: number; band: Band; about: About } {
  const cents = centsBetween(referenceHz, measuredHz);
  if (Math.abs(cents) > 600) {
    throw new BadReading({
      code: 'impossible',
      field: 'pitch',
      sentence: `Pitch: ${plainAmount(measuredHz, 'Hz')} is more than half an octave away from ${plainAmount(referenceHz, 'Hz')}: wrong note name or octave? Read the tuner again.`,
    });
  }
  return { cents, band: bandByAmount(cents, TUNER_ERROR_CENTS[tuner]), about: ABOUT_CENTS };
}
