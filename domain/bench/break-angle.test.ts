import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { breakAngle, breakWarnings, sideBreakAngle } from './break-angle.ts';
import { nutFriction } from './nut-friction.ts';

const head = {
  headstockAngleDeg: 14,
  slotToPostMm: 80,
  slotAboveFaceMm: 6,
  stringAboveFaceMm: 4,
};

describe('break angle', () => {
  it('is the headstock angle when the string runs along the face, and grows with it', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 24, noNaN: true }), (headstockAngleDeg) => {
        const parallel = { ...head, headstockAngleDeg, stringAboveFaceMm: 6 };
        expect(sideBreakAngle(parallel)).toBeCloseTo(headstockAngleDeg, 9);
        const steeper = { ...head, headstockAngleDeg: headstockAngleDeg + 1 };
        expect(sideBreakAngle(steeper)).toBeGreaterThan(
          sideBreakAngle({ ...head, headstockAngleDeg }),
        );
      }),
    );
  });

  it('in space is the one from the side when the string runs straight down the middle', () => {
    const straight = { ...head, slotYMm: 0, contactYMm: 0, saddleMm: { x: -647.7, y: 0, z: 0 } };
    const { totalDeg, elevationDeg } = breakAngle(straight);
    expect(totalDeg).toBeCloseTo(elevationDeg, 9);
    expect(breakAngle({ ...straight, contactYMm: 20 }).totalDeg).toBeGreaterThan(totalDeg);
    expect(breakAngle({ ...straight, contactYMm: -20 }).totalDeg).toBeCloseTo(
      breakAngle({ ...straight, contactYMm: 20 }).totalDeg,
      9,
    );
  });

  it('rattles below 5°, binds above 20°, and is quiet from 6 to 17°', () => {
    const codes = [4.9, 5.5, 6, 17, 19, 20.1].map((angle) => breakWarnings(angle)[0]?.code);
    expect(codes).toEqual([
      'shallow',
      'outside-band',
      undefined,
      undefined,
      'outside-band',
      'steep',
    ]);
  });
});

describe('friction in the slot', () => {
  it('is nothing without friction or angle and grows with both', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 0.9, noNaN: true }),
        fc.double({ min: 1, max: 40, noNaN: true }),
        (friction, angle) => {
          expect(nutFriction(0, angle).tensionRatio).toBe(1);
          expect(nutFriction(friction, 0).hangCents).toBe(0);
          const one = nutFriction(friction, angle);
          expect(nutFriction(friction + 0.05, angle).hangCents).toBeGreaterThan(one.hangCents);
          expect(one.hangCents).toBeCloseTo(600 * Math.log2(one.tensionRatio), 6);
        },
      ),
    );
  });
});
