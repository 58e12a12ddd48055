import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compoundRadius, radiusDrop, radiusFromSag, saddleArc } from './radius.ts';

const radius = fc.double({ min: 35, max: 600, noNaN: true });
const offset = fc.double({ min: 1, max: 30, noNaN: true });

describe('radius drop', () => {
  it('is 0 in the middle and on a flat board, alike on both sides, and grows outward', () => {
    fc.assert(
      fc.property(radius, offset, (r, y) => {
        expect(radiusDrop(r, 0)).toBe(0);
        expect(radiusDrop('flat', y)).toBe(0);
        expect(radiusDrop(r, -y)).toBe(radiusDrop(r, y));
        expect(radiusDrop(r, y * 1.1)).toBeGreaterThan(radiusDrop(r, y));
        if (r < 500) expect(radiusDrop(r * 1.1, y)).toBeLessThan(radiusDrop(r, y));
      }),
    );
  });

  it('gives the radius back from its own sag', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 36, max: 590, noNaN: true }),
        fc.double({ min: 5, max: 30, noNaN: true }),
        (r, y) => {
          expect(Number(radiusFromSag(radiusDrop(r, y), 2 * y)) / r).toBeCloseTo(1, 9);
        },
      ),
    );
    expect(radiusFromSag(0, 50)).toBe('flat');
  });

  it('refuses an offset past the edge, and 0 for flat', () => {
    expect(() => radiusDrop(42, 42)).toThrow('offset larger than the radius');
    expect(() => radiusDrop(0, 10)).toThrow('choose flat, not 0');
    expect(() => radiusDrop(12, 10)).toThrow('Probably meant: 12 in, which is 304.8 mm.');
  });
});

describe('compound radius', () => {
  it('is the radius of the nut at 0, of the end at the end, and straight between', () => {
    fc.assert(
      fc.property(radius, radius, fc.double({ min: 200, max: 700, noNaN: true }), (a, b, end) => {
        expect(compoundRadius(a, b, end, 0).radiusMm).toBeCloseTo(a, 9);
        expect(compoundRadius(a, b, end, end).radiusMm).toBeCloseTo(b, 9);
        expect(compoundRadius(a, b, end, end / 2).radiusMm).toBeCloseTo((a + b) / 2, 9);
        expect(compoundRadius(a, a, end, 650).radiusMm).toBeCloseTo(a, 9);
      }),
    );
  });
});

describe('saddle arc', () => {
  it('is the tilt on a flat board, and the drop of a round one below an even wish', () => {
    const offsetsMm = [-26, -13, 0, 13, 26];
    const flat = saddleArc({ boardRadius: 'flat', offsetsMm, firstMm: 4, lastMm: 3 });
    expect(flat).toEqual([4, 3.75, 3.5, 3.25, 3]);
    const round = saddleArc({ boardRadius: 304.8, offsetsMm, firstMm: 4, lastMm: 4 });
    expect(round[2]).toBe(4);
    expect(round[0]).toBeCloseTo(4 - radiusDrop(304.8, 26), 9);
    expect(round[0]).toBe(round[4]);
    expect(() => saddleArc({ boardRadius: 300, offsetsMm: [3], firstMm: 4, lastMm: 4 })).toThrow(
      'at least two strings',
    );
  });
});
