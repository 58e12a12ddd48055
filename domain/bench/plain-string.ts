import { type About, type Band, bandByShare, type Warning } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { CORE_MATERIALS, type CoreMaterial } from './string-materials.ts';
import { type Sounding, tensionOf } from './string-tension.ts';
import { fieldOf, within } from './within.ts';

export interface PlainString extends Sounding {
  /** Steel 0.15 to 1.0 mm, gut and plastics 0.3 to 1.6 mm. */
  diameterMm: number;
  material?: CoreMaterial;
}

export interface StringPull {
  massPerLengthKgM: number;
  tensionN: number;
  band: Band;
  warnings: Warning[];
  about: About;
}

const ABOUT_PLAIN: About = {
  formula: 'T = μ (2 L f)², μ = ρ π d²/4',
  basis: 'computed',
  source: 'Ideal flexible string; densities from memory, ±0.6 % for steel',
};

/** Strength of the wire in MPa: a materials page for ASTM A228 that was read; thin wire is stronger. */
const WIRE_STRENGTH_MPA = 2450;
/** Share of that strength from which a string is called near its breaking pitch: common practice. */
const NEAR_BREAKING = 0.8;
/** ± on the formula and density together, before the micrometer's error. */
const FORMULA_SHARE = 0.02;

/**
 * Mass per metre and pull of a plain string: μ = ρ π d²/4, T = μ (2 L f)².
 * Band: ±2 % and twice the micrometer's share, as T goes with d² (±0.005 mm is ±3.6 % on a
 * .011 in string).
 * @throws BadReading for a gauge, scale or pitch out of range
 * Warns when the pull lies outside 20 to 400 N, and for steel near its breaking pitch.
 * Source: ideal flexible string, computed; densities from memory.
 */
export function plainStringPull(string: PlainString): StringPull {
  const material = CORE_MATERIALS[string.material ?? 'steel'];
  const field = material === CORE_MATERIALS.steel ? 'plainGauge' : 'softPlainGauge';
  const diameterMm = within(field, string.diameterMm);
  const areaMm2 = (Math.PI * diameterMm ** 2) / 4;
  const massPerLengthKgM = material.densityKgM3 * areaMm2 * 1e-6;
  const tensionN = tensionOf(massPerLengthKgM, string);
  const share = FORMULA_SHARE + (2 * (fieldOf(field).error ?? 0)) / diameterMm;
  const warnings = pullWarnings(tensionN);
  const stressMpa = tensionN / areaMm2;
  if (material === CORE_MATERIALS.steel && stressMpa > NEAR_BREAKING * WIRE_STRENGTH_MPA) {
    warnings.push({
      code: 'near-breaking',
      sentence: `Near breaking pitch: ${plainAmount(Math.round(stressMpa), 'MPa')} in the wire, of about ${WIRE_STRENGTH_MPA}. Check gauge and pitch before tuning up.`,
    });
  }
  const band = bandByShare(tensionN, share);
  return { massPerLengthKgM, tensionN, band, warnings, about: ABOUT_PLAIN };
}

/** Pulls that no usual string has: the gauge or the pitch was probably taken wrongly. Common practice. */
export function pullWarnings(tensionN: number): Warning[] {
  const [low, high] = fieldOf('stringPull').usual ?? [0, Infinity];
  if (tensionN >= low && tensionN <= high) return [];
  return [
    {
      code: 'unusual-pull',
      sentence: `${plainAmount(Math.round(tensionN), 'N')} is outside the usual ${low} to ${plainAmount(high, 'N')} of one string. Check its gauge and pitch.`,
    },
  ];
}
