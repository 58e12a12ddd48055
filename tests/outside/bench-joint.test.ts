import { describe, expect, it } from 'vitest';
import { headstockSection } from '#domain/bench/headstock-section.ts';
import { scarfStress } from '#domain/bench/scarf.ts';
import { splineStress } from '#domain/bench/spline.ts';
import { type ShearWood, strengthRatio, WOOD_SHEAR } from '#domain/bench/wood-strength.ts';
import { casesOf, expectCase, expectNear, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-joint');

describe('section at the nut', () => {
  it.each(casesOf(cases, 'headstock.section', 5))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { total_tension_n = NaN, slot_above_section_centroid_mm = NaN } = inputs;
    const head = {
      headstockAngleDeg: inputs['headstock_angle_deg'] ?? NaN,
      slotToPostMm: inputs['nut_to_posts_mm'] ?? NaN,
      slotAboveFaceMm: inputs['slot_above_face_mm'] ?? NaN,
      stringAboveFaceMm: inputs['string_at_post_above_face_mm'] ?? NaN,
    };
    const found = headstockSection(total_tension_n, head, slot_above_section_centroid_mm);
    const actual = {
      axial_compression_n: found.beyondNut.axialN,
      shear_n: found.beyondNut.shearN,
      moment_nm: found.beyondNut.momentNm,
      break_angle_deg: found.breakAngleDeg,
      behind_nut_axial_n: found.behindNut.axialN,
      behind_nut_shear_n: found.behindNut.shearN,
      behind_nut_moment_nm: found.behindNut.momentNm,
      face_normal_popular_nm: found.faceNormalNm,
    };
    expectCase(one, actual, one.tolerance);
  });
});

describe('splines', () => {
  it.each(casesOf(cases, 'glue.spline', 4))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { count = NaN, length_mm = NaN, width_mm = NaN, depth_mm = NaN, force_n = NaN } = inputs;
    const splines = { count, lengthMm: length_mm, widthMm: width_mm, depthMm: depth_mm };
    const stress = splineStress(splines, force_n);
    const actual = { area_mm2: stress.gluedAreaMm2, average_shear_mpa: stress.shearOverGluedMpa };
    expectCase(one, actual, one.tolerance);
    expectNear(stress.averageShearMpa, 2 * stress.shearOverGluedMpa, { rel: 1e-12 });
  });
});

describe('scarf', () => {
  it.each(casesOf(cases, 'glue.scarf', 4))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { width_mm = NaN, thickness_mm = NaN, face_angle_to_axis_deg = NaN } = inputs;
    const { axial_compression_n = NaN, transverse_shear_n = NaN } = inputs;
    const stress = scarfStress(
      { widthMm: width_mm, thicknessMm: thickness_mm, faceAngleDeg: face_angle_to_axis_deg },
      { axialN: axial_compression_n, shearN: transverse_shear_n, momentNm: 0 },
    );
    const actual = {
      area_mm2: stress.areaMm2,
      average_shear_mpa: stress.averageShearMpa,
      average_normal_mpa_compression_positive: stress.averageNormalMpa,
    };
    expectCase(one, actual, { rel: one.tolerance['rel'], abs: one.tolerance['abs_mpa'] });
  });
});

// Names of the woods in the cases, which say more than the list of the program.
const NAMES: Record<string, ShearWood> = {
  'Sugar maple': 'sugar maple',
  'Sugar maple (in-lb)': 'sugar maple',
  'White ash': 'white ash',
  'Black cherry': 'black cherry',
  'Bigleaf maple': 'bigleaf maple',
  'American mahogany (Swietenia macrophylla)': 'American mahogany',
  'African mahogany (Khaya)': 'African mahogany',
  'Ponderosa pine (control value)': 'ponderosa pine',
  'Sitka spruce': 'Sitka spruce',
  'Black walnut': 'black walnut',
  'Red maple': 'red maple',
  'Western redcedar': 'western redcedar',
  'Indian rosewood': 'Indian rosewood',
};

describe('shear strength of woods', () => {
  const shear = casesOf(cases, 'wood.shear_parallel', 13);

  it.each(shear)('$id', (one) => {
    const wood = NAMES[one.inputs['species'] as string];
    if (wood === undefined) return expect.unreachable();
    const { shearMpa, basis } = WOOD_SHEAR[wood];
    expectCase(one, { shear_mpa: shearMpa }, one.tolerance);
    expect(basis).toBe(one.obtained === 'read' ? 'published' : 'from memory');
  });

  it('stands in the program for no wood that is not checked', () => {
    const checked = shear.map((one) => NAMES[one.inputs['species'] as string]);
    expect(new Set(checked)).toEqual(new Set(Object.keys(WOOD_SHEAR)));
  });
});

describe('ratio of strength to shear', () => {
  it.each(casesOf(cases, 'glue.ratio', 4))('$id', (one) => {
    const { force_n = NaN, area_mm2 = NaN, wood_shear_mpa = NaN } = one.inputs as Inputs;
    const average_shear_mpa = force_n / area_mm2;
    const { ratio } = strengthRatio(wood_shear_mpa, average_shear_mpa);
    expectCase(one, { average_shear_mpa, ratio }, one.tolerance);
  });
});
