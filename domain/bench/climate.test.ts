import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeClimate } from './climate-band.ts';
import { crackMovement, movementWarnings, widthChange } from './crack.ts';
import { dewPoint, wetsInRoom } from './dew-point.ts';
import { equilibriumMoisture } from './moisture.ts';
import { movementFromShrinkage, WOOD_MOVEMENT } from './wood-movement.ts';

const temperature = fc.double({ min: 0, max: 45, noNaN: true });
const humidity = fc.double({ min: 5, max: 90, noNaN: true });

describe('moisture content of wood', () => {
  it('rises with humidity, stays below saturation, and falls with warmth above 10 °C', () => {
    fc.assert(
      fc.property(temperature, humidity, (t, rh) => {
        const { moisturePct, band } = equilibriumMoisture(t, rh);
        expect(equilibriumMoisture(t, rh + 5).moisturePct).toBeGreaterThan(moisturePct);
        expect(moisturePct).toBeGreaterThan(0);
        expect(moisturePct).toBeLessThan(30);
        expect(band.high - band.low).toBeCloseTo(2, 9);
        if (t > 10) {
          expect(equilibriumMoisture(t + 5, rh).moisturePct).toBeLessThan(moisturePct);
        }
      }),
    );
  });

  it('is refused outside the table, with what was probably meant', () => {
    expect(() => equilibriumMoisture(20, 130)).toThrow(
      'Relative humidity: 130 % is outside 5 to 95 %.',
    );
    expect(() => equilibriumMoisture(20, 130)).toThrow('Probably meant: 30 %.');
    expect(() => equilibriumMoisture(20, 0.45)).toThrow('Probably meant: 45 %.');
    expect(() => equilibriumMoisture(68, 45)).toThrow('Probably meant: 68 °F, which is 20 °C.');
    expect(() => equilibriumMoisture(NaN, 45)).toThrow('this is not a number');
  });
});

describe('movement across the grain', () => {
  const dry = { temperatureC: 21, humidityPct: 30 };
  const usual = { temperatureC: 21, humidityPct: 50 };

  it('is nothing without change, turns with the direction and grows with the width', () => {
    fc.assert(
      fc.property(fc.double({ min: 10, max: 900, noNaN: true }), (width) => {
        const change = (start: number, end: number) => widthChange(width, 0.00148, start, end);
        expect(change(9, 9)).toBe(0);
        expect(change(9, 6)).toBeCloseTo(-change(6, 9), 9);
        expect(change(9, 6)).toBeLessThan(0);
      }),
    );
    const wide = crackMovement(400, 'Sitka spruce', 'radial', usual, dry);
    const narrow = crackMovement(200, 'Sitka spruce', 'radial', usual, dry);
    expect(wide.changeMm).toBeCloseTo(2 * narrow.changeMm, 9);
    expect(wide.band.low).toBeLessThan(wide.changeMm);
  });

  it('is larger along the rings than across them for every wood', () => {
    for (const { radial, tangential } of Object.values(WOOD_MOVEMENT)) {
      expect(tangential).toBeGreaterThan(radial);
    }
  });

  it('warns outside 6 to 14 %', () => {
    expect(movementWarnings(6, 14)).toEqual([]);
    expect(movementWarnings(5.9, 9)).toHaveLength(1);
    expect(movementWarnings(9, 14.1)).toHaveLength(1);
  });

  it('grows with shrinkage', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 15, noNaN: true }), (shrinkage) => {
        const movement = movementFromShrinkage(shrinkage);
        expect(movement).toBeGreaterThan(shrinkage / 3000);
        expect(movementFromShrinkage(shrinkage + 0.5)).toBeGreaterThan(movement);
      }),
    );
  });
});

describe('dew point', () => {
  it('is the air’s own temperature at 100 %, below it otherwise, and not given in frost', () => {
    fc.assert(
      fc.property(temperature, humidity, (t, rh) => {
        expect(dewPoint(t, 100)).toBeCloseTo(t, 9);
        const dew = dewPoint(t, rh);
        if (dew !== null) {
          expect(dew).toBeLessThan(t);
          expect(dew).toBeGreaterThanOrEqual(0);
          expect(dewPoint(t, rh + 5)).toBeGreaterThan(dew);
        }
      }),
    );
    expect(dewPoint(5, 40)).toBeNull();
    expect(() => dewPoint(20, 130)).toThrow('is outside 1 to 100 %');
  });

  it('tells a cold case from a dry one', () => {
    const room = { temperatureC: 21, humidityPct: 50 };
    expect(wetsInRoom(4, room)?.sentence).toContain('Leave it shut');
    expect(wetsInRoom(12, room)).toBeNull();
    expect(wetsInRoom(-1, { temperatureC: 2, humidityPct: 40 })).toBeNull();
  });
});

describe('air at the bench', () => {
  it('is safe, tolerable or outside, with what it does', () => {
    const judged = (t: number, rh: number) => {
      const { standing, warnings } = judgeClimate(t, rh);
      return [standing, ...warnings.map((warning) => warning.code)];
    };
    expect(judged(20, 45)).toEqual(['safe']);
    expect(judged(24, 55)).toEqual(['safe']);
    expect(judged(20, 42)).toEqual(['tolerable']);
    expect(judged(20, 60)).toEqual(['tolerable']);
    expect(judged(20, 38)).toEqual(['outside', 'humidity']);
    expect(judged(20, 34)).toEqual(['outside', 'dry']);
    expect(judged(20, 66)).toEqual(['outside', 'damp']);
    expect(judged(27, 50)).toEqual(['outside', 'temperature']);
  });
});
