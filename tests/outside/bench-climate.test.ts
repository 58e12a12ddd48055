import psychrolib from 'psychrolib';
import { describe, expect, it } from 'vitest';
import { widthChange } from '#domain/bench/crack.ts';
import { dewPoint, saturationPressure } from '#domain/bench/dew-point.ts';
import { equilibriumMoisture } from '#domain/bench/moisture.ts';
import {
  movementFromShrinkage,
  type MovingWood,
  WOOD_MOVEMENT,
} from '#domain/bench/wood-movement.ts';
import { casesOf, expectCase, expectNear, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-climate');

describe('moisture content of wood', () => {
  it.each(casesOf(cases, 'wood.emc', 15))('$id', ({ inputs, expected, tolerance }) => {
    const { temperature_c = NaN, rh_pct = NaN } = inputs as Inputs;
    const { moisturePct } = equilibriumMoisture(temperature_c, rh_pct);
    expect(Object.keys(expected).sort()).toEqual(['emc_pct_equation', 'emc_pct_table']);
    const table = expected['emc_pct_table'] as number;
    expectNear(moisturePct, table, { abs: tolerance['abs_pct_vs_table'] });
    const equation = expected['emc_pct_equation'] as number;
    expectNear(moisturePct, equation, { abs: tolerance['abs_pct_vs_equation'] });
  });
});

describe('movement of woods', () => {
  const movement = casesOf(cases, 'wood.dim_coefficient', 11);

  it.each(movement)('$id', (one) => {
    const species = one.inputs['species'] as MovingWood;
    const wood = WOOD_MOVEMENT[species];
    expectCase(one, { CR: wood.radial, CT: wood.tangential }, one.tolerance);
    expect(wood.basis).toBe(one.obtained === 'read' ? 'published' : 'from memory');
  });

  it('stands in the program for no wood that is not checked', () => {
    const checked = movement.map((one) => one.inputs['species'] as string);
    expect(new Set(checked)).toEqual(new Set(Object.keys(WOOD_MOVEMENT)));
  });

  it.each(casesOf(cases, 'wood.coef_from_shrinkage', 6))(
    '$id from shrinkage',
    ({ inputs, expected, tolerance }) => {
      const movementPerPct = movementFromShrinkage(inputs['shrinkage_pct'] as number);
      expect(Object.keys(expected).sort()).toEqual(['C', 'C_table']);
      expectNear(movementPerPct, expected['C'] as number, { rel: 1e-8 });
      const table = expected['C_table'] as number;
      expectNear(movementPerPct, table, { abs: tolerance['abs_vs_table'] });
    },
  );
});

describe('change of width', () => {
  it.each(casesOf(cases, 'wood.crack_opening', 6))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { width_mm = NaN, coefficient = NaN } = inputs;
    const { emc_start_pct = NaN, emc_end_pct = NaN } = inputs;
    const change_mm = widthChange(width_mm, coefficient, emc_start_pct, emc_end_pct);
    expectCase(one, { change_mm }, { abs: one.tolerance['abs_mm'] });
    // The moisture contents of the case are those of the published table at that air.
    for (const [humidity, moisture] of [
      [inputs['rh_start_pct'], emc_start_pct],
      [inputs['rh_end_pct'], emc_end_pct],
    ]) {
      const { moisturePct } = equilibriumMoisture(inputs['temperature_c'] ?? NaN, humidity ?? NaN);
      expectNear(moisturePct, moisture ?? NaN, { abs: 0.07 });
    }
  });
});

describe('dew point', () => {
  it.each(casesOf(cases, 'climate.dew_point', 8))('$id', (one) => {
    const { temperature_c = NaN, rh_pct = NaN } = one.inputs as Inputs;
    const dew = dewPoint(temperature_c, rh_pct);
    if (dew === null) return expect.unreachable();
    const actual = { dew_c_magnus: dew, dew_c_psychrolib: dew, dew_c_coolprop: dew };
    expectCase(one, actual, { abs: one.tolerance['abs_c'] });
  });

  it('agrees with a humid-air library over the whole range above frost', () => {
    // Second reference: npm psychrolib (ASHRAE Handbook - Fundamentals 2017, chapter 1).
    psychrolib.SetUnitSystem(psychrolib.SI);
    let compared = 0;
    for (let temperature = 0; temperature <= 40; temperature += 2) {
      for (let humidity = 5; humidity <= 100; humidity += 5) {
        const dew = dewPoint(temperature, humidity);
        if (dew === null) continue;
        const reference = psychrolib.GetTDewPointFromRelHum(temperature, humidity / 100);
        expectNear(dew, reference, { abs: 0.05 });
        compared += 1;
      }
    }
    expect(compared).toBeGreaterThan(200);
  });
});

describe('saturation pressure', () => {
  it.each(casesOf(cases, 'climate.saturation_pressure', 4))('$id', (one) => {
    const pa = saturationPressure(one.inputs['temperature_c'] as number);
    expectCase(one, { pa }, one.tolerance);
  });

  it('agrees with a humid-air library to 0.4 %', () => {
    psychrolib.SetUnitSystem(psychrolib.SI);
    for (let temperature = 1; temperature <= 50; temperature += 1) {
      const reference = psychrolib.GetSatVapPres(temperature);
      expectNear(saturationPressure(temperature), reference, { rel: 0.004 });
    }
  });
});
