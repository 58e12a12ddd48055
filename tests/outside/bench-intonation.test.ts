import { describe, expect, it } from 'vitest';
import { nutOffset } from '#domain/bench/nut-offset.ts';
import { lengthToCents, saddleMove } from '#domain/bench/saddle-move.ts';
import { frettingStretch } from '#domain/bench/stretch.ts';
import { casesOf, expectCase, expectNear, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-intonation');

describe('saddle move', () => {
  it.each(casesOf(cases, 'intonation.saddle_move', 7))('$id', ({ inputs, expected, tolerance }) => {
    const { scale_mm = NaN, error_cents = NaN, present_compensation_mm } = inputs as Inputs;
    const move = saddleMove(scale_mm, error_cents, present_compensation_mm);
    expect(Object.keys(expected).sort()).toEqual(['direction', 'exact_mm', 'first_order_mm']);
    const abs = tolerance['abs_mm'];
    expectNear(move.firstOrderMm, expected['first_order_mm'] as number, { abs });
    expectNear(move.exactMm, expected['exact_mm'] as number, { abs });
    expect(move.direction).toBe(expected['direction']);
  });
});

describe('change of length in cents', () => {
  it.each(casesOf(cases, 'intonation.length_to_cents', 4))('$id', (one) => {
    const { length_mm = NaN, delta_mm = NaN } = one.inputs as Inputs;
    const cents = lengthToCents(length_mm, delta_mm);
    expectCase(one, { cents }, { abs: one.tolerance['abs_cents'] });
  });
});

describe('nut offset', () => {
  it.each(casesOf(cases, 'intonation.nut_offset', 4))('$id', (one) => {
    const { scale_mm = NaN, nut_forward_mm = NaN } = one.inputs as Inputs;
    const fretted_notes_change_cents = nutOffset(scale_mm, nut_forward_mm).cents;
    expectCase(one, { fretted_notes_change_cents }, { abs: one.tolerance['abs_cents'] });
  });
});

describe('stretch of a fretted string', () => {
  it.each(casesOf(cases, 'intonation.stretch', 4))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const stretch = frettingStretch({
      scaleMm: inputs['scale_mm'] ?? NaN,
      fret: inputs['fret'] ?? NaN,
      nutHeightMm: inputs['nut_height_above_fret_plane_mm'] ?? NaN,
      saddleHeightMm: inputs['saddle_height_above_fret_plane_mm'] ?? NaN,
      coreDiameterMm: inputs['core_diameter_mm'] ?? NaN,
      modulusGpa: inputs['E_gpa'],
      tensionN: inputs['tension_n'] ?? NaN,
      totalLengthMm: inputs['total_string_mm'] ?? NaN,
    });
    const actual = {
      delta_length_mm: stretch.lengthChangeMm,
      delta_tension_n: stretch.tensionChangeN,
      cents_sharp: stretch.cents,
    };
    expectCase(one, actual, one.tolerance);
  });
});
