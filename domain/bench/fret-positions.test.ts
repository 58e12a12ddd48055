import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fretPosition, fretPositions } from './fret-positions.ts';
import { unusualScale } from './unusual-scale.ts';

const scale = fc.double({ min: 200, max: 1100, noNaN: true });

describe('fret positions', () => {
  it('put the 12th fret at half the scale and the 24th at three quarters', () => {
    fc.assert(
      fc.property(scale, (scaleMm) => {
        expect(fretPosition(scaleMm, 12)).toBeCloseTo(scaleMm / 2, 9);
        expect(fretPosition(scaleMm, 24)).toBeCloseTo(scaleMm * 0.75, 9);
      }),
    );
  });

  it('rise, with spaces that shrink and add up, and stay short of the saddle', () => {
    fc.assert(
      fc.property(scale, fc.integer({ min: 2, max: 36 }), (scaleMm, count) => {
        const frets = fretPositions(scaleMm, count);
        const sum = frets.reduce((total, fret) => total + fret.spaceMm, 0);
        expect(frets).toHaveLength(count);
        expect(sum).toBeCloseTo(frets.at(-1)?.fromNutMm ?? 0, 9);
        expect(sum).toBeLessThan(scaleMm);
        frets.slice(1).forEach((fret, index) => {
          expect(fret.spaceMm).toBeLessThan(frets[index]?.spaceMm ?? 0);
        });
      }),
    );
  });

  it('refuse no scale, a scale in inches and half a fret', () => {
    expect(() => fretPosition(0, 1)).toThrow('Scale length: 0 mm is outside 200 to 1100 mm');
    expect(() => fretPosition(25.5, 1)).toThrow('Probably meant: 25.5 in, which is 647.7 mm.');
    expect(() => fretPosition(647.7, 1.5)).toThrow('1.5 is not a whole number');
    expect(() => fretPosition(647.7, 0)).toThrow('the first one is 1');
  });
});

describe('a scale for its kind of instrument', () => {
  it('is told when the doubling was forgotten', () => {
    expect(unusualScale(323.85, 'guitar')).toMatchObject({ code: 'not-doubled' });
    expect(unusualScale(323.85, 'guitar')?.sentence).toContain('647.7 mm');
    expect(unusualScale(900, 'mandolin')).toMatchObject({ code: 'unusual-scale' });
    expect(unusualScale(647.7, 'guitar')).toBeNull();
    expect(unusualScale(560, 'guitar')).toBeNull();
  });
});
