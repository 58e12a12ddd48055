import { BadReading } from './bad-reading.ts';
import { type About, bandByShare } from './figure.ts';
import { type StringPull, pullWarnings } from './plain-string.ts';
import { plainAmount } from './plain-number.ts';
import { CORE_MATERIALS, WRAP_MATERIALS } from './string-materials.ts';
import { type Sounding, tensionOf } from './string-tension.ts';
import { within } from './within.ts';

/** Round wire fills π/4 of the ring it is wound in: an identity, but for the slope of the helix. */
export const ROUND_PACKING = Math.PI / 4;
/** Flat or ground wrap fills 0.90 to 0.98: common practice; the middle. */
export const FLAT_PACKING = 0.94;
/** Core of a wound string as a share of its gauge when it is not known (0.35 to 0.50): common practice. */
export const ASSUMED_CORE_SHARE = 0.42;
/** Area of a hexagon across flats s is 0.8660 s²; its corners lie on a circle of 1.1547 s. */
const HEX_AREA = Math.sqrt(3) / 2;
const HEX_CORNERS = 2 / Math.sqrt(3);

/** ± share to print with the pull: common practice. */
export const WOUND_BANDS = { coreKnown: 0.05, coreAssumed: 0.08, flatOrLayered: 0.12 } as const;

export interface WrapLayer {
  /** Over this layer, mm. */
  outerMm: number;
  /** Of the wrap, 900 to 20000 kg/m³, see WRAP_MATERIALS; nickel-plated steel when left out. */
  densityKgM3?: number;
  /** Flat, ground or round wrap. */
  flat?: boolean;
}

export interface WoundString extends Sounding {
  /** Core, mm; across the flats when `hexCore`. null: 0.42 of the gauge is assumed. */
  coreMm: number | null;
  /** See CORE_MATERIALS; steel when left out. */
  coreDensityKgM3?: number;
  hexCore?: boolean;
  /** From the inside out; the last one's `outerMm` is the gauge, 0.4 to 3.6 mm. */
  layers: readonly [WrapLayer, ...WrapLayer[]];
}

export interface WoundPull extends StringPull {
  coreMm: number;
  coreAssumed: boolean;
}

const ABOUT_WOUND: About = {
  formula: 'T = μ (2 L f)², μ = (π/4) [ρc d² + k ρw (D² − d²)]',
  basis: 'computed',
  source: 'Round wire close-wound on a round core; densities from memory',
};

const ABOUT_ASSUMED: About = {
  ...ABOUT_WOUND,
  basis: 'common practice',
  source: `${ABOUT_WOUND.source}; core assumed at ${ASSUMED_CORE_SHARE} of the gauge, common practice`,
};

/**
 * Mass per metre and pull of a wound string, layer by layer outward:
 * μ = (π/4) [ρc d² + Σ k ρw (D² − d²)], T = μ (2 L f)².
 * Band: ±5 % core known, ±8 % assumed, ±12 % flat or in layers. The exact helix is 0.4 to 1.2 % heavier.
 * @throws BadReading for a gauge, core, scale or pitch out of range, and `impossible` when a core
 *   or an inner layer is not thinner than what lies over it
 * Source: geometry, computed; densities from memory; assumed core and bands common practice.
 */
export function woundStringPull(string: WoundString): WoundPull {
  const gaugeMm = within('woundGauge', string.layers.at(-1)?.outerMm ?? NaN);
  const coreAssumed = string.coreMm === null;
  const coreMm = within('core', string.coreMm ?? ASSUMED_CORE_SHARE * gaugeMm);
  const coreDensity = within('density', string.coreDensityKgM3 ?? CORE_MATERIALS.steel.densityKgM3);
  const coreArea = string.hexCore ? HEX_AREA * coreMm ** 2 : (Math.PI / 4) * coreMm ** 2;
  let massPerLengthKgM = coreDensity * coreArea * 1e-6;
  let insideMm = string.hexCore ? HEX_CORNERS * coreMm : coreMm;
  for (const layer of string.layers) {
    thinner(insideMm, layer.outerMm);
    const density = within(
      'density',
      layer.densityKgM3 ?? WRAP_MATERIALS['nickel-plated steel'].densityKgM3,
    );
    massPerLengthKgM += ringMass(insideMm, layer.outerMm, density, layer.flat);
    insideMm = layer.outerMm;
  }
  const tensionN = tensionOf(massPerLengthKgM, string);
  const layered = string.layers.length > 1 || string.layers.some((layer) => layer.flat);
  const share = layered
    ? WOUND_BANDS.flatOrLayered
    : coreAssumed
      ? WOUND_BANDS.coreAssumed
      : WOUND_BANDS.coreKnown;
  return {
    massPerLengthKgM,
    tensionN,
    band: bandByShare(tensionN, share),
    warnings: pullWarnings(tensionN),
    about: coreAssumed ? ABOUT_ASSUMED : ABOUT_WOUND,
    coreMm,
    coreAssumed,
  };
}

function ringMass(insideMm: number, outsideMm: number, densityKgM3: number, flat = false): number {
  const packing = flat ? FLAT_PACKING : ROUND_PACKING;
  return packing * densityKgM3 * (Math.PI / 4) * (outsideMm ** 2 - insideMm ** 2) * 1e-6;
}

function thinner(insideMm: number, outsideMm: number): void {
  if (insideMm < outsideMm) return;
  throw new BadReading({
    code: 'impossible',
    field: 'core',
    sentence: `String core: ${plainAmount(insideMm, 'mm')} inside ${plainAmount(outsideMm, 'mm')}. The core cannot be thicker than the string; measure both again.`,
  });
}

/**
 * Mass per metre, kg, of one layer of round wire wound close on a round core, with the true length
 * of the helix: ρw (π dw²/4) √((π Dm)² + dw²)/dw + core, Dm = d + dw, all in mm.
 * It stands beside the closed form to show how far that is off.
 * @throws BadReading `impossible` when the core is not thinner than the string
 * Source: geometry, computed.
 */
export function helixMassPerLength(
  coreMm: number,
  outerMm: number,
  coreDensityKgM3: number,
  wrapDensityKgM3: number,
): number {
  thinner(coreMm, outerMm);
  const wireMm = (outerMm - coreMm) / 2;
  const wireArea = (Math.PI / 4) * wireMm ** 2;
  const turns = Math.hypot(Math.PI * (coreMm + wireMm), wireMm) / wireMm;
  const coreArea = (Math.PI / 4) * coreMm ** 2;
  return (coreDensityKgM3 * coreArea + wrapDensityKgM3 * wireArea * turns) * 1e-6;
}
