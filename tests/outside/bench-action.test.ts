import { describe, expect, it } from 'vitest';
import { saddleChange } from '#domain/bench/action.ts';
import { compoundRadius, radiusDrop, radiusFromSag } from '#domain/bench/radius.ts';
import { reliefEffect } from '#domain/bench/relief.ts';
import { casesOf, expectCase, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-action');

describe('saddle change for a change of action', () => {
  it.each(casesOf(cases, 'action.saddle_change', 5))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { changeMm } = saddleChange({
      scaleMm: inputs['scale_mm'] ?? NaN,
      compensationMm: inputs['compensation_mm'],
      fret: inputs['fret'],
      changeMm: inputs['wanted_action_change_mm'] ?? NaN,
    });
    expectCase(one, { saddle_change_mm: changeMm }, { abs: one.tolerance['abs_mm'] });
  });
});

describe('what relief does to action', () => {
  it.each(casesOf(cases, 'action.relief_effect', 4))('$id', (one) => {
    const { scale_mm = NaN, joint_fret = NaN, relief_change_mm = NaN } = one.inputs as Inputs;
    const { actionChangeMm } = reliefEffect(scale_mm, joint_fret, relief_change_mm);
    expectCase(one, { action12_change_mm: actionChangeMm }, { abs: one.tolerance['abs_mm'] });
  });
});

describe('drop of a radiused board', () => {
  it.each(casesOf(cases, 'radius.drop', 5))('$id', (one) => {
    const { radius_mm = NaN, offset_from_centre_mm = NaN } = one.inputs as Inputs;
    const drop_mm = radiusDrop(radius_mm, offset_from_centre_mm);
    const back = radiusFromSag(drop_mm, 2 * offset_from_centre_mm);
    if (back === 'flat') return expect.unreachable();
    expectCase(one, { drop_mm, radius_back_mm: back }, { abs: one.tolerance['abs_mm'] });
  });
});

describe('compound radius', () => {
  it.each(casesOf(cases, 'radius.compound', 4))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { radius_at_nut_mm = NaN, radius_at_end_mm = NaN, end_x_mm = NaN, x_mm = NaN } = inputs;
    const { radiusMm } = compoundRadius(radius_at_nut_mm, radius_at_end_mm, end_x_mm, x_mm);
    expectCase(one, { radius_mm: radiusMm }, { abs: one.tolerance['abs_mm'] });
  });
});
