import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fretPosition } from './fret-positions.ts';
import { nutOffset } from './nut-offset.ts';
import {
  BEFORE_INTONATION,
  demandSettled,
  lengthToCents,
  octaveError,
  saddleMove,
  travelLeft,
} from './saddle-move.ts';
import { frettingStretch } from './stretch.ts';

const scale = fc.double({ min: 300, max: 1000, noNaN: true });
const error = fc.double({ min: -30, max: 30, noNaN: true });
const compensation = fc.double({ min: 0, max: 6, noNaN: true });

describe('saddle move', () => {
  it('leaves an exact octave when its pitch ratio is worked out anew', () => {
    fc.assert(
      fc.property(scale, error, compensation, (scaleMm, cents, c) => {
        const { exactMm } = saddleMove(scaleMm, cents, c);
        // Ratio k L0/L12 now is 2 × 2^(e/1200); k stays; after the move it has to be 2.
        const k = (2 * 2 ** (cents / 1200) * (scaleMm / 2 + c)) / (scaleMm + c);
        const after = (k * (scaleMm + c + exactMm)) / (scaleMm / 2 + c + exactMm);
        expect(1200 * Math.log2(after / 2)).toBeCloseTo(0, 6);
      }),
    );
  });

  it('lengthens sharp strings, shortens flat ones, and moves more for more', () => {
    fc.assert(
      fc.property(scale, fc.double({ min: 0.1, max: 30, noNaN: true }), (scaleMm, cents) => {
        const sharp = saddleMove(scaleMm, cents);
        const flat = saddleMove(scaleMm, -cents);
        expect(sharp).toMatchObject({ direction: 'lengthen', words: 'back' });
        expect(flat).toMatchObject({ direction: 'shorten', words: 'forward' });
        expect(sharp.exactMm).toBeGreaterThan(0);
        expect(flat.firstOrderMm).toBeCloseTo(-sharp.firstOrderMm, 12);
        expect(saddleMove(scaleMm, cents * 1.1).exactMm).toBeGreaterThan(sharp.exactMm);
      }),
    );
  });

  it('comes to its first order as the error goes to nothing', () => {
    fc.assert(
      fc.property(scale, (scaleMm) => {
        const difference = (cents: number) => {
          const { exactMm, firstOrderMm } = saddleMove(scaleMm, cents);
          return Math.abs(exactMm / firstOrderMm - 1);
        };
        expect(difference(10)).toBeLessThan(0.01);
        expect(difference(0.1)).toBeLessThan(0.0001);
      }),
    );
  });

  it('is an estimate of ±20 %, and nothing at no error', () => {
    const { band, firstOrderMm } = saddleMove(647.7, -5);
    expect(band.low).toBeCloseTo(firstOrderMm * 1.2, 9);
    expect(band.high).toBeCloseTo(firstOrderMm * 0.8, 9);
    expect(saddleMove(647.7, 0, 2)).toMatchObject({ exactMm: 0, direction: 'none', words: 'none' });
  });

  it('reads the error from two pitches and refuses one that is too far', () => {
    expect(octaveError(110, 220)).toBeCloseTo(0, 9);
    expect(octaveError(110, 220.5)).toBeCloseTo(3.93, 2);
    expect(() => octaveError(110, 240)).toThrow('wrong note, wrong fret');
    expect(() => saddleMove(647.7, 51)).toThrow('Far too much');
  });

  it('waits until strings, relief, nut and action are settled', () => {
    const all = { strings: true, relief: true, nut: true, action: true };
    expect(() => demandSettled(all)).not.toThrow();
    for (const step of BEFORE_INTONATION) {
      expect(() => demandSettled({ ...all, [step]: false })).toThrow(
        expect.objectContaining({ code: 'too-early' }),
      );
    }
    expect(() => demandSettled({ ...all, nut: false, action: false })).toThrow(
      'this was read before the nut height and the action;',
    );
  });

  it('says how much travel is left', () => {
    expect(travelLeft(1, { backMm: 3, forwardMm: 0 })).toBe(2);
    expect(travelLeft(-1, { backMm: 0, forwardMm: 1 })).toBe(0);
    expect(() => travelLeft(2, { backMm: 1.5, forwardMm: 9 })).toThrow(
      'a move of 2 mm back is asked and 1.5 mm is left',
    );
  });
});

describe('length and nut', () => {
  it('flatten with length, and a move there and back is nothing', () => {
    fc.assert(
      fc.property(scale, fc.double({ min: 0.01, max: 20, noNaN: true }), (length, change) => {
        expect(lengthToCents(length, change)).toBeLessThan(0);
        const there = lengthToCents(length, change);
        expect(there + lengthToCents(length + change, -change)).toBeCloseTo(0, 9);
      }),
    );
  });

  it('make 1 % of length 17.23 cents', () => {
    expect(lengthToCents(500, 5)).toBeCloseTo(-17.226, 3);
  });

  it('lower every fretted note with the nut moved, near 1731.2 x/S, and not at all with none', () => {
    fc.assert(
      fc.property(scale, fc.double({ min: 0.01, max: 1.5, noNaN: true }), (scaleMm, offset) => {
        const { cents } = nutOffset(scaleMm, offset);
        expect(cents).toBeLessThan(0);
        expect(cents / ((-1731.2 * offset) / scaleMm)).toBeCloseTo(1, 2);
      }),
    );
    expect(nutOffset(647.7, 0).cents).toBe(0);
    expect(() => nutOffset(647.7, 2)).toThrow('not compensation');
  });
});

describe('stretch of a fretted string', () => {
  const string = {
    scaleMm: 647.7,
    fret: 12,
    nutHeightMm: 0.5,
    saddleHeightMm: 4,
    coreDiameterMm: 0.254,
    tensionN: 72.1,
    totalLengthMm: 760,
  };

  it('is nothing for a string lying on the frets and grows with the saddle', () => {
    expect(frettingStretch({ ...string, nutHeightMm: 0, saddleHeightMm: 0 }).cents).toBe(0);
    fc.assert(
      fc.property(fc.double({ min: 1, max: 10, noNaN: true }), (saddleHeightMm) => {
        const low = frettingStretch({ ...string, saddleHeightMm });
        const high = frettingStretch({ ...string, saddleHeightMm: saddleHeightMm + 0.5 });
        expect(high.cents).toBeGreaterThan(low.cents);
      }),
    );
  });

  it('is near 2h²/S at the 12th fret, h the mean height', () => {
    const { lengthChangeMm } = frettingStretch(string);
    expect(lengthChangeMm / ((2 * 2.25 ** 2) / fretPosition(647.7, 12) / 2)).toBeCloseTo(1, 2);
  });
});
