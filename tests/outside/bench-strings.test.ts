import { describe, expect, it } from 'vitest';
import { inharmonicity, partialSharpness, youngSharpness } from '#domain/bench/inharmonicity.ts';
import { noteFrequency } from '#domain/bench/pitch.ts';
import { plainStringPull } from '#domain/bench/plain-string.ts';
import { type SetString, stringSetPull } from '#domain/bench/string-set.ts';
import { convert, MM_PER_INCH } from '#domain/bench/units.ts';
import { helixMassPerLength, ROUND_PACKING, woundStringPull } from '#domain/bench/wound-string.ts';
import { casesOf, expectCase, expectNear, type Inputs, readCases } from './bench-cases.ts';

const cases = readCases('bench-strings');
const mm = (inches: number) => inches * MM_PER_INCH;
const lbf = (newtons: number) => convert(newtons, 'N', 'lbf');

describe('pull of a plain string', () => {
  it.each(casesOf(cases, 'string.tension.plain', 6))('$id', (one) => {
    const { diameter_in = NaN, midi = NaN, scale_mm = NaN, density_kg_m3 } = one.inputs as Inputs;
    expect(density_kg_m3).toBe(7850);
    const pull = plainStringPull({
      diameterMm: mm(diameter_in),
      scaleMm: scale_mm,
      frequencyHz: noteFrequency(midi),
    });
    const { massPerLengthKgM: mu_kg_m, tensionN: tension_n } = pull;
    expectCase(one, { mu_kg_m, tension_n, tension_lbf: lbf(tension_n) }, one.tolerance);
  });
});

describe('pull of a wound string', () => {
  it.each(casesOf(cases, 'string.tension.wound', 6))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { outer_in = NaN, core_in = NaN, core_density = NaN, wrap_density = NaN } = inputs;
    expectNear(inputs['packing'] ?? NaN, ROUND_PACKING, { rel: 1e-12 });
    const pull = woundStringPull({
      scaleMm: inputs['scale_mm'] ?? NaN,
      frequencyHz: noteFrequency(inputs['midi'] ?? NaN),
      coreMm: mm(core_in),
      coreDensityKgM3: core_density,
      layers: [{ outerMm: mm(outer_in), densityKgM3: wrap_density }],
    });
    const helix = helixMassPerLength(mm(core_in), mm(outer_in), core_density, wrap_density);
    const { massPerLengthKgM: mu_kg_m, tensionN: tension_n } = pull;
    const actual = { mu_kg_m, tension_n, tension_lbf: lbf(tension_n), mu_exact_helix_kg_m: helix };
    expectCase(one, actual, { rel: one.tolerance['rel'] });
    expectNear(mu_kg_m, helix, { rel: one.tolerance['helix_vs_closed_form_rel'] });
  });
});

interface SetCase {
  scale_mm: number;
  strings: { outer_in: number; core_in: number | null; midi: number }[];
}

describe('pull of a set', () => {
  it.each(casesOf(cases, 'string.set.total', 6))('$id', (one) => {
    const { scale_mm: scaleMm, strings } = one.inputs as unknown as SetCase;
    expect(one.inputs).toMatchObject({ steel_density: 7850, wrap_density: 7900 });
    const set = strings.map(({ outer_in, core_in, midi }): SetString => {
      const sounding = { scaleMm, frequencyHz: noteFrequency(midi) };
      return core_in === null
        ? { wound: false, ...sounding, diameterMm: mm(outer_in) }
        : { wound: true, ...sounding, coreMm: mm(core_in), layers: [{ outerMm: mm(outer_in) }] };
    });
    const { each, totalN, band } = stringSetPull(set);
    const each_n = each.map((pull) => pull.tensionN);
    const actual = { each_n, total_n: totalN, total_lbf: lbf(totalN) };
    expectCase(one, actual, { rel: one.tolerance['rel'] });
    const share = one.tolerance['physical_band_rel'];
    if (share !== undefined) expectNear(band.high, totalN * (1 + share), { rel: 1e-9 });
  });
});

describe('stiffness of a string', () => {
  it.each(casesOf(cases, 'string.inharmonicity', 4))('$id', (one) => {
    const inputs = one.inputs as Inputs;
    const { diameter_cm = NaN, length_cm = NaN, f0_hz = NaN, mode = NaN } = inputs;
    const diameterMm = diameter_cm * 10;
    const lengthMm = length_cm * 10;
    const string = { diameterMm, scaleMm: lengthMm, frequencyHz: f0_hz };
    const { tensionN } = plainStringPull(string);
    // E/ρ comes in (cm/s)²; with steel's 7850 kg/m³ that is E in GPa.
    const modulusGpa = ((inputs['E_over_rho_cm2_s2'] ?? NaN) * 1e-4 * 7850) / 1e9;
    const B = inharmonicity({ diameterMm, lengthMm, tensionN, modulusGpa });
    const cents_exact_from_B = partialSharpness(B, mode);
    const cents_young = youngSharpness(diameterMm, lengthMm, f0_hz, mode);
    expectCase(one, { cents_young, B, cents_exact_from_B }, { rel: one.tolerance['rel'] });
    expectNear(cents_young, cents_exact_from_B, { rel: one.tolerance['young_vs_B_rel'] });
  });
});
