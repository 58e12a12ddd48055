import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { centsBetween, noteFrequency, noteNumber, tuningError } from './pitch.ts';

const hz = fc.double({ min: 20, max: 2000, noNaN: true });

describe('pitch', () => {
  it('doubles with every octave and rises with every note', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 115 }), (note) => {
        expect(noteFrequency(note + 12) / noteFrequency(note)).toBeCloseTo(2, 12);
        expect(noteFrequency(note + 1)).toBeGreaterThan(noteFrequency(note));
      }),
    );
  });

  it('gives 100 cents from one note to the next at any reference', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 16, max: 100 }),
        fc.double({ min: 380, max: 480, noNaN: true }),
        (note, a4) => {
          const cents = centsBetween(noteFrequency(note, a4), noteFrequency(note + 1, a4));
          expect(cents).toBeCloseTo(100, 9);
        },
      ),
    );
  });

  it('changes sign when measured and reference change places, and adds up', () => {
    fc.assert(
      fc.property(hz, hz, hz, (a, b, c) => {
        expect(centsBetween(a, b)).toBeCloseTo(-centsBetween(b, a), 9);
        expect(centsBetween(a, b) + centsBetween(b, c)).toBeCloseTo(centsBetween(a, c), 8);
      }),
    );
  });

  it('reads names with sharps, flats and low octaves', () => {
    expect(noteNumber('A4')).toBe(69);
    expect(noteNumber('F♯3')).toBe(54);
    expect(noteNumber('Bb2')).toBe(noteNumber('A#2'));
    expect(noteNumber('c-1')).toBe(0);
    expect(() => noteNumber('H2')).toThrow('H2 is not a note name');
    expect(() => noteNumber('E')).toThrow('and the octave');
  });

  it('carries the error of the tuner', () => {
    const { cents, band } = tuningError(110, 110.5, 'strobe');
    expect(cents).toBeCloseTo(7.8514, 3);
    expect(band.high - cents).toBeCloseTo(0.1, 9);
    expect(tuningError(110, 110.5).band.low).toBeCloseTo(cents - 1, 9);
  });

  it('refuses silence and the wrong octave', () => {
    expect(() => centsBetween(440, 0)).toThrow('A pitch must be above 0 Hz');
    expect(() => tuningError(196, 392)).toThrow('wrong note name or octave?');
    expect(tuningError(440, 440 * 2 ** 0.5 * 0.9999).cents).toBeLessThan(600);
  });
});
