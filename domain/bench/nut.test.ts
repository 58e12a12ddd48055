import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { courseSpacing, nutSpacing } from './nut-spacing.ts';
import { slotPlanAngle, slottedAngle, touchingSide } from './plan-angle.ts';
import { clearanceWarnings, slotClearance } from './slot-height.ts';

const gauges = fc.array(fc.double({ min: 0.2, max: 2.6, noNaN: true }), {
  minLength: 4,
  maxLength: 8,
});

describe('nut spacing', () => {
  it('spends the whole width on gaps and strings, both ways', () => {
    fc.assert(
      fc.property(gauges, (diameters) => {
        const metal = diameters.reduce((sum, one) => sum + one, 0);
        const spacing = nutSpacing(60, diameters);
        expect(metal + spacing.gapMm * (diameters.length - 1)).toBeCloseTo(60, 9);
        const gaps = spacing.equalStepGapsMm.reduce((sum, one) => sum + one, 0);
        expect(metal + gaps).toBeCloseTo(60, 9);
        expect(spacing.centresMm[0]).toBe((diameters[0] ?? 0) / 2);
        expect(spacing.centresMm.at(-1)).toBeCloseTo(60 - (diameters.at(-1) ?? 0) / 2, 9);
        expect(spacing.equalStepCentresMm.at(-1)).toBeCloseTo(spacing.centresMm.at(-1) ?? 0, 9);
      }),
    );
  });

  it('mirrors when the strings are turned round', () => {
    fc.assert(
      fc.property(gauges, (diameters) => {
        const forward = nutSpacing(60, diameters).centresMm;
        const back = nutSpacing(60, [...diameters].reverse()).centresMm.reverse();
        forward.forEach((centre, index) => expect(60 - centre).toBeCloseTo(back[index] ?? 0, 9));
      }),
    );
  });

  it('keeps pairs together and courses apart', () => {
    const pair = [0.28, 0.28];
    const { centresMm, gapMm } = courseSpacing(26, [pair, pair, pair, pair], 2);
    expect(centresMm).toHaveLength(8);
    expect((centresMm[1] ?? 0) - (centresMm[0] ?? 0)).toBeCloseTo(2.28, 9);
    expect((centresMm[2] ?? 0) - (centresMm[1] ?? 0)).toBeCloseTo(gapMm + 0.28, 9);
    expect(8 * 0.28 + 4 * 2 + 3 * gapMm).toBeCloseTo(26, 9);
  });

  it('refuses crowding, a single string and a gauge in thousandths', () => {
    expect(() => nutSpacing(15, [1, 1, 1, 1, 1])).toThrow('too crowded for this width');
    expect(() => nutSpacing(40, [1])).toThrow('at least two strings');
    expect(() => nutSpacing(40, [1, 11])).toThrow(
      'String 2. String gauge: 11 mm is outside 0.15 to 3.6 mm.',
    );
  });
});

describe('slot height', () => {
  it('leaves less over fret 1 than the slot is high, in proportion', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 0.5, noNaN: true }), (slot) => {
        const { clearanceMm } = slotClearance(slot);
        expect(clearanceMm).toBeLessThanOrEqual(slot);
        expect(slotClearance(2 * slot).clearanceMm).toBeCloseTo(2 * clearanceMm, 12);
        expect(slotClearance(slot, 2).clearanceMm).toBeLessThanOrEqual(clearanceMm);
      }),
    );
  });

  it('says fill and recut below the frets, deepen when high, nothing within the target', () => {
    expect(() => slotClearance(-0.1)).toThrow(
      'Slot below the fret plane: it will buzz, fill and recut.',
    );
    expect(slotClearance(0.5).warnings).toMatchObject([{ code: 'slot-high' }]);
    expect(clearanceWarnings(0.01)).toMatchObject([{ code: 'slot-low' }]);
    expect(clearanceWarnings(0.02)).toEqual([]);
    expect(clearanceWarnings(0.15)).toEqual([]);
    expect(() => slotClearance(0.1, 5)).toThrow('Hold the string at fret 2 or 3');
  });
});

describe('plan angle of a slot', () => {
  const slotY = fc.double({ min: -25, max: 25, noNaN: true });
  const post = fc.record({
    xMm: fc.double({ min: 20, max: 200, noNaN: true }),
    yMm: fc.double({ min: -50, max: 50, noNaN: true }),
    radiusMm: fc.double({ min: 1.5, max: 6, noNaN: true }),
  });
  const side = fc.constantFrom('low' as const, 'high' as const);

  it('mirrors across the centre line', () => {
    fc.assert(
      fc.property(slotY, post, side, (y, at, touching) => {
        const one = slotPlanAngle(y, at, touching);
        const mirror = { ...at, yMm: -at.yMm };
        const other = slotPlanAngle(-y, mirror, touching === 'low' ? 'high' : 'low');
        expect(other.angleDeg).toBeCloseTo(-one.angleDeg, 9);
        expect(other.freeLengthMm).toBeCloseTo(one.freeLengthMm, 9);
        if (y !== 0) expect(other.direction).toBe(one.direction);
      }),
    );
  });

  it('gives a line that touches the post and no more, on the side asked', () => {
    fc.assert(
      fc.property(slotY, post, side, (y, at, touching) => {
        const { angleDeg, touchesAtMm } = slotPlanAngle(y, at, touching);
        const angle = (angleDeg * Math.PI) / 180;
        // Signed distance of the post's middle from the string's line.
        const distance = (at.yMm - y) * Math.cos(angle) - at.xMm * Math.sin(angle);
        expect(distance).toBeCloseTo(touching === 'low' ? at.radiusMm : -at.radiusMm, 9);
        const reach = Math.hypot(touchesAtMm.x - at.xMm, touchesAtMm.y - at.yMm);
        expect(reach).toBeCloseTo(at.radiusMm, 9);
      }),
    );
  });

  it('costs 8.6° at 40 mm and 4.6° at 75 mm on the wrong side', () => {
    const cost = (xMm: number) => {
      const at = { xMm, yMm: 10, radiusMm: 3 };
      return slotPlanAngle(10, at, 'high').angleDeg - slotPlanAngle(10, at, 'low').angleDeg;
    };
    expect(cost(40)).toBeCloseTo(8.6, 1);
    expect(cost(75)).toBeCloseTo(4.6, 1);
  });

  it('names the direction and the error of the rule', () => {
    const outer = slotPlanAngle(17, { xMm: 45, yMm: 27, radiusMm: 3 }, 'low');
    expect(outer.direction).toBe('outward');
    expect(outer.band.high - outer.angleDeg).toBeCloseTo(0.62, 1);
    expect(slotPlanAngle(-17, { xMm: 45, yMm: -17, radiusMm: 3 }, 'high').direction).toBe('inward');
    expect(slottedAngle(5, 60, 5).direction).toBe('straight');
    expect(slottedAngle(5, 60, 10).direction).toBe('outward');
  });

  it('takes the side from the form of the head', () => {
    expect(touchingSide({ kind: 'two-sided' }, 27)).toBe('low');
    expect(touchingSide({ kind: 'two-sided' }, -27)).toBe('high');
    expect(touchingSide({ kind: 'one-sided', keys: 'high' }, -5)).toBe('low');
    expect(touchingSide({ kind: 'one-sided', keys: 'low' }, 5)).toBe('high');
    expect(() => touchingSide({ kind: 'two-sided' }, 0)).toThrow('on the centre line');
  });

  it('refuses a post under the nut', () => {
    const under = { xMm: 5, yMm: 0, radiusMm: 3 };
    expect(() => slotPlanAngle(0, under, 'low')).toThrow('Post under the nut: check coordinates');
  });
});
