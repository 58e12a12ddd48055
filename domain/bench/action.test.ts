import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { saddleChange } from './action.ts';
import { reliefEffect } from './relief.ts';
import { ACTION_TARGETS, againstTarget, RELIEF_TARGETS_MM } from './targets.ts';

const scale = fc.double({ min: 300, max: 1000, noNaN: true });
const change = fc.double({ min: -3, max: 3, noNaN: true });

describe('saddle change', () => {
  it('is twice the change at the 12th fret, and more the nearer the nut it is read', () => {
    fc.assert(
      fc.property(scale, change, (scaleMm, changeMm) => {
        const at = (fret: number) => saddleChange({ scaleMm, changeMm, fret }).changeMm;
        expect(at(12)).toBeCloseTo(2 * changeMm, 9);
        expect(Math.abs(at(7))).toBeGreaterThanOrEqual(Math.abs(at(12)));
        expect(saddleChange({ scaleMm, changeMm: -changeMm }).changeMm).toBeCloseTo(-at(12), 9);
      }),
    );
  });

  it('keeps 1 mm of saddle proud', () => {
    const input = { scaleMm: 647.7, changeMm: -0.5 };
    expect(saddleChange({ ...input, saddleProudMm: 2 }).proudAfterMm).toBeCloseTo(1, 9);
    expect(() => saddleChange({ ...input, saddleProudMm: 1.9 })).toThrow(
      'Not enough saddle: look at the neck angle.',
    );
    expect(saddleChange({ ...input, changeMm: 0.1, saddleProudMm: 0.5 }).proudAfterMm).toBeCloseTo(
      0.7,
      9,
    );
    expect(saddleChange(input).proudAfterMm).toBeNull();
  });
});

describe('relief and action', () => {
  it('go together, in proportion, most for the shortest neck', () => {
    fc.assert(
      fc.property(scale, fc.double({ min: 0.01, max: 0.9, noNaN: true }), (scaleMm, relief) => {
        const at = (joint: number, r = relief) => reliefEffect(scaleMm, joint, r).actionChangeMm;
        expect(at(14)).toBeGreaterThan(0);
        expect(at(14, -relief)).toBeCloseTo(-at(14), 12);
        expect(at(12)).toBeCloseTo(2 * relief, 9);
        expect(at(17)).toBeLessThan(at(14));
      }),
    );
    expect(() => reliefEffect(647.7, 10, 0.1)).toThrow('Fret at the body joint');
  });
});

describe('targets', () => {
  it('run from low to high, bass over treble', () => {
    for (const { bassMm, trebleMm } of Object.values(ACTION_TARGETS)) {
      expect(bassMm[0]).toBeLessThan(bassMm[1]);
      expect(trebleMm[0]).toBeLessThan(trebleMm[1]);
      expect(bassMm[1]).toBeGreaterThan(trebleMm[1]);
    }
    for (const [low, high] of Object.values(RELIEF_TARGETS_MM)) expect(low).toBeLessThan(high);
  });

  it('count both ends as inside', () => {
    const target = ACTION_TARGETS.electric.bassMm;
    expect([1.59, 1.6, 2.0, 2.01].map((value) => againstTarget(value, target))).toEqual([
      'below',
      'inside',
      'inside',
      'above',
    ]);
  });
});
