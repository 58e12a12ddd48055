import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { stringAtPost } from './break-angle.ts';
import { forcesBeyondNut, headstockSection } from './headstock-section.ts';
import { jointCheck, type JointCheckInput } from './joint-check.ts';
import { scarfAngle, scarfStress } from './scarf.ts';
import { splineMoment } from './spline-moment.ts';
import { splineStress } from './spline.ts';
import { strengthRatio, WOOD_SHEAR } from './wood-strength.ts';

const positive = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('section forces', () => {
  const head = fc.record({
    headstockAngleDeg: positive(0, 20),
    slotToPostMm: positive(40, 200),
    slotAboveFaceMm: positive(5, 9),
    stringAboveFaceMm: positive(2, 5),
  });

  it('are those of the string’s line by vector product', () => {
    fc.assert(
      fc.property(head, positive(100, 1500), positive(5, 25), (side, pull, e) => {
        const found = headstockSection(pull, side, e);
        const { xMm, zMm } = stringAtPost(side);
        const length = Math.hypot(xMm, zMm);
        // The strings pull the head from the post back to the slot; the middle of the section is e below it.
        const force = { x: (-pull * xMm) / length, z: (-pull * zMm) / length };
        const moment = Math.abs(xMm * force.z - (zMm + e) * force.x) / 1000;
        expect(found.beyondNut.momentNm).toBeCloseTo(moment, 6);
        expect(found.beyondNut.axialN).toBeCloseTo(-force.x, 6);
        expect(Math.abs(found.beyondNut.shearN)).toBeCloseTo(Math.abs(force.z), 6);
      }),
    );
  });

  it('are the same before and behind the nut for a string that does not break', () => {
    const { axialN, shearN, momentNm } = forcesBeyondNut(500, 0, 12);
    expect({ axialN, shearN, momentNm }).toEqual({ axialN: 500, shearN: 0, momentNm: 6 });
  });
});

describe('scarf', () => {
  it('has the wood’s section at 90° and grows as the slant flattens', () => {
    fc.assert(
      fc.property(positive(5, 60), positive(5, 60), positive(5, 80), (w, t, angle) => {
        const forces = { axialN: 400, shearN: 0, momentNm: 5 };
        const at = (faceAngleDeg: number) =>
          scarfStress({ widthMm: w, thicknessMm: t, faceAngleDeg }, forces);
        expect(at(90).areaMm2).toBeCloseTo(w * t, 9);
        expect(at(angle).areaMm2).toBeGreaterThan(at(angle + 5).areaMm2);
        expect(at(angle).openingMpa).toBeLessThan(at(angle + 5).openingMpa);
        expect(at(angle).largestShearMpa).toBeGreaterThan(at(angle).averageShearMpa);
      }),
    );
  });

  it('comes to the worked figures of bending on 42 × 16 mm at 5.76 N m', () => {
    // 3.21 MPa outside; 0.75 along and 0.19 open at 14°, 0.44/0.06 at 8°, 1.03/0.38 at 20°.
    for (const [faceAngleDeg, shear, opening] of [
      [14, 0.75, 0.19],
      [8, 0.44, 0.06],
      [20, 1.03, 0.38],
    ] as const) {
      const face = { widthMm: 42, thicknessMm: 16, faceAngleDeg };
      const found = scarfStress(face, { axialN: 480, shearN: 0, momentNm: 5.76 });
      expect(found.bendingMpa).toBeCloseTo(3.21, 2);
      expect(found.largestShearMpa - found.averageShearMpa).toBeCloseTo(shear, 2);
      expect(found.openingMpa).toBeCloseTo(opening, 2);
    }
  });

  it('takes its slant from thickness and length', () => {
    expect(scarfAngle(17, 17)).toBeCloseTo(45, 9);
    expect(scarfAngle(17, 26)).toBeCloseTo(33.2, 1);
    expect(() => scarfAngle(17, 0)).toThrow('Zero or negative size');
  });
});

describe('splines', () => {
  const splines = { count: 2, lengthMm: 80, widthMm: 9, depthMm: 8 };

  it('work with the shorter side only', () => {
    const centred = splineStress(splines, 500);
    expect(centred.workingAreaMm2).toBe(centred.gluedAreaMm2 / 2);
    const off = splineStress({ ...splines, shorterSideMm: 25 }, 500);
    expect(off.workingAreaMm2).toBe(2 * 25 * 25);
    expect(off.averageShearMpa).toBeGreaterThan(centred.averageShearMpa);
    expect(() => splineStress({ ...splines, shorterSideMm: 50 }, 1)).toThrow('nearer end');
    expect(() => splineStress({ ...splines, lengthMm: 0 }, 1)).toThrow('Zero or negative size');
  });

  it('balance the moment: pressed wood and splines pull alike about the lever', () => {
    fc.assert(
      fc.property(positive(1, 20), positive(30, 60), positive(12, 25), (moment, w, t) => {
        const found = splineMoment(splines, moment, w, t);
        const splineAt = t - 4;
        // Strain grows in a straight line from the end of the pressed wood to the splines.
        const area = 2 * 9 * 8;
        const pressed = (w * found.pressedMm ** 2) / 2;
        expect(pressed / (area * (splineAt - found.pressedMm))).toBeCloseTo(1, 9);
        // The same moment by adding up the pressed wood in strips, its pull equal to the splines'.
        const strips = 2000;
        const depth = found.pressedMm / strips;
        let stripMoment = 0;
        for (let strip = 0.5; strip < strips; strip += 1) {
          const stress = ((2 * found.forceN) / (w * found.pressedMm)) * (1 - strip / strips);
          stripMoment += stress * w * depth * (splineAt - strip * depth);
        }
        expect(stripMoment / 1000 / moment).toBeCloseTo(1, 5);
        expect(found.leverMm).toBeLessThan(t - 4);
      }),
    );
  });

  it('bear less in a thicker neck and more with the moment', () => {
    const at = (moment: number, t: number) => splineMoment(splines, moment, 43, t).averageShearMpa;
    expect(at(10, 20)).toBeLessThan(at(10, 17));
    expect(at(20, 17)).toBeCloseTo(2 * at(10, 17), 9);
  });

  it('must fit the neck', () => {
    expect(() => splineMoment(splines, 10, 18, 17)).toThrow('do not fit a neck of 18 mm by 17 mm');
    expect(() => splineMoment(splines, 10, 43, 8)).toThrow('do not fit');
  });
});

describe('joint check', () => {
  const input: JointCheckInput = {
    pullN: 814,
    place: 'beyond nut',
    breakAngleDeg: 9,
    stringToMiddleMm: 13.5,
    widthMm: 43,
    thicknessMm: 17,
    breakLengthMm: 26,
    wood: 'American mahogany',
    splines: { count: 2, lengthMm: 80, widthMm: 9, depthMm: 8 },
  };

  it('puts its figures together from the parts', () => {
    const { forces, slantDeg, alone, splined, strength } = jointCheck(input);
    expect(forces).toEqual(forcesBeyondNut(814, 9, 13.5));
    expect(slantDeg).toBe(scarfAngle(17, 26));
    expect(alone.ratio).toBeCloseTo(
      WOOD_SHEAR['American mahogany'].shearMpa / alone.largestShearMpa,
    );
    expect(alone.areaMm2 / 100).toBeCloseTo(13.4, 1);
    expect(alone.ratio).toBeCloseTo(2.9, 1);
    expect(splined?.workingAreaMm2).toBe(2000);
    expect(splined?.ratio).toBeGreaterThan(alone.ratio);
    expect(strength.basis).toBe('published');
  });

  it('has no shear across the neck behind the nut, and no splines when there are none', () => {
    const { forces, splined } = jointCheck({ ...input, place: 'behind nut', splines: null });
    expect(forces).toMatchObject({ axialN: 814, shearN: 0 });
    expect(splined).toBeNull();
  });

  it('never offers a ratio without a force', () => {
    expect(() => strengthRatio(8.48, 0)).toThrow('without a force there is no ratio');
    const { ratio, low, high } = strengthRatio(10, 2);
    expect([low, ratio, high]).toEqual([expect.closeTo(4.3, 9), 5, expect.closeTo(5.7, 9)]);
  });
});
