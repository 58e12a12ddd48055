import { describe, expect, it } from 'vitest';
import { breakAngle } from '#domain/bench/break-angle.ts';
import { nutFriction } from '#domain/bench/nut-friction.ts';
import { nutSpacing } from '#domain/bench/nut-spacing.ts';
import { slotPlanAngle } from '#domain/bench/plan-angle.ts';
import { slotClearance } from '#domain/bench/slot-height.ts';
import { casesOf, expectCase, expectNear, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-nut');

describe('nut spacing', () => {
  it.each(casesOf(cases, 'nut.spacing', 4))('$id', (one) => {
    const gauges = one.inputs['diameters_mm'] as number[];
    const spacing = nutSpacing(one.inputs['outer_width_mm'] as number, gauges);
    const actual = {
      gap_mm: spacing.gapMm,
      centres_equal_gaps_mm: spacing.centresMm,
      centres_equal_centres_mm: spacing.equalStepCentresMm,
      gaps_if_equal_centres_mm: spacing.equalStepGapsMm,
    };
    expectCase(one, actual, { abs: one.tolerance['abs_mm'] });
  });
});

describe('slot height', () => {
  it.each(casesOf(cases, 'nut.slot_height', 4))('$id', (one) => {
    const { slot_above_fret_plane_mm = NaN, held_at_fret } = one.inputs as Inputs;
    const { clearanceMm, factor } = slotClearance(slot_above_fret_plane_mm, held_at_fret);
    const actual = { clearance_at_fret1_mm: clearanceMm, factor };
    expectCase(one, actual, { abs: one.tolerance['abs_mm'] });
  });
});

describe('plan angle of a slot', () => {
  it.each(casesOf(cases, 'nut.plan_angle', 6))('$id', ({ inputs, expected, tolerance }) => {
    const { slot_y_mm = NaN, post_x_mm = NaN, post_y_mm = NaN } = inputs as Inputs;
    const radiusMm = inputs['post_radius_mm'] as number;
    const post = { xMm: post_x_mm, yMm: post_y_mm, radiusMm };
    const side = inputs['string_side'] === 'low_y' ? 'low' : 'high';
    const plan = slotPlanAngle(slot_y_mm, post, side);
    expect(Object.keys(expected)).toHaveLength(3);
    expectNear(plan.angleDeg, expected['plan_angle_deg'] as number, { abs: tolerance['abs_deg'] });
    const abs = tolerance['abs_mm'];
    expectNear(plan.freeLengthMm, expected['free_length_mm'] as number, { abs });
    const [x = NaN, y = NaN] = expected['tangent_point_mm'] as number[];
    expectNear(plan.touchesAtMm.x, x, { abs });
    expectNear(plan.touchesAtMm.y, y, { abs });
  });
});

describe('break angle', () => {
  it.each(casesOf(cases, 'nut.break_angle', 4))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const [x = NaN, y = NaN, z = NaN] = one.inputs['saddle_xyz_mm'] as number[];
    const found = breakAngle({
      headstockAngleDeg: inputs['headstock_angle_deg'] ?? NaN,
      slotToPostMm: inputs['slot_to_contact_along_face_mm'] ?? NaN,
      slotAboveFaceMm: inputs['slot_above_face_mm'] ?? NaN,
      stringAboveFaceMm: inputs['string_at_post_above_face_mm'] ?? NaN,
      slotYMm: inputs['slot_y_mm'] ?? NaN,
      contactYMm: inputs['contact_y_mm'] ?? NaN,
      saddleMm: { x, y, z },
    });
    const actual = {
      elevation_break_deg: found.elevationDeg,
      total_break_deg: found.totalDeg,
      contact_x_mm: found.contactMm.x,
      contact_z_mm: found.contactMm.z,
    };
    expectCase(one, actual, { abs: one.tolerance['abs_deg'] });
  });
});

describe('friction in the slot', () => {
  it.each(casesOf(cases, 'nut.friction', 4))('$id', (one) => {
    const { mu = NaN, angle_deg = NaN } = one.inputs as Inputs;
    const { tensionRatio, hangCents } = nutFriction(mu, angle_deg);
    const actual = { tension_ratio: tensionRatio, possible_pitch_hang_cents: hangCents };
    expectCase(one, actual, one.tolerance);
  });
});
