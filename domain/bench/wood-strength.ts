import type { About, Basis } from './figure.ts';
import { MPA_PER_LBF_IN2 } from './units.ts';
import { within } from './within.ts';

export interface WoodShear {
  name: string;
  /** Shear along the grain, clear straight-grained wood at 12 % moisture, MPa. */
  shearMpa: number;
  basis: Basis;
  source: string;
}

const TABLE_5_3 = 'USDA Forest Products Laboratory, Wood Handbook, GTR-190, Table 5-3';
const TABLE_113 = 'Wood Handbook, GTR-113, Table 4-5b';

const metric = (name: string, shearMpa: number, basis: Basis, source: string): WoodShear => ({
  name,
  shearMpa,
  basis,
  source,
});
const inch = (name: string, lbfIn2: number, basis: Basis, source: string): WoodShear =>
  metric(name, lbfIn2 * MPA_PER_LBF_IN2, basis, source);

const READ = `${TABLE_5_3}; read on a page that reproduces it`;
const QUOTED = `${TABLE_113}; read as quoted on a mailing list`;
const MEMORY = `${TABLE_5_3}; from memory`;

/** Woods with their shear strength along the grain. */
export const WOOD_SHEAR = {
  'sugar maple': metric('Sugar maple', 16.1, 'published', READ),
  'white ash': inch('White ash', 1910, 'published', READ),
  'bigleaf maple': inch('Bigleaf maple', 1730, 'published', READ),
  'black cherry': inch('Black cherry', 1700, 'published', READ),
  'American mahogany': inch('American mahogany', 1230, 'published', QUOTED),
  'African mahogany': inch('African mahogany (khaya)', 1500, 'published', QUOTED),
  'ponderosa pine': metric('Ponderosa pine', 7.8, 'published', `${TABLE_5_3}a; read`),
  'Sitka spruce': metric('Sitka spruce', 7.9, 'from memory', MEMORY),
  'black walnut': metric('Black walnut', 9.4, 'from memory', MEMORY),
  'red maple': metric('Red maple', 12.8, 'from memory', MEMORY),
  'western redcedar': metric('Western redcedar', 6.8, 'from memory', MEMORY),
  'Indian rosewood': metric(
    'Indian rosewood',
    14.4,
    'from memory',
    'Wood Handbook, Table 5-5a; from memory',
  ),
} as const satisfies Record<string, WoodShear>;

export type ShearWood = keyof typeof WOOD_SHEAR;

/** Scatter of the table's values, ± share: from memory. */
export const STRENGTH_SCATTER = 0.14;
/** What decades of load leave of a short-term strength: from memory. */
export const LONG_LOAD_SHARE = 0.6;

const ABOUT_RATIO: About = {
  formula: 'ratio = shear strength of clear wood / shear stress in the joint',
  basis: 'computed',
  source:
    'Strength of the wood, with its own source, over a computed stress; a ratio, not a promise',
};

/**
 * Published shear strength over the shear in the joint. It is a ratio and is called nothing else: it
 * certifies no repair. Taken on the largest shear, where bending counts.
 * @param strengthMpa 1 to 30 MPa  @param shearMpa above 0
 * @throws BadReading outside these ranges
 * Band: ±14 % from the scatter of the wood alone (from memory).
 */
export function strengthRatio(
  strengthMpa: number,
  shearMpa: number,
): { ratio: number; low: number; high: number; about: About } {
  within('shearStrength', strengthMpa);
  within('stress', shearMpa);
  const ratio = strengthMpa / shearMpa;
  return {
    ratio,
    low: ratio * (1 - STRENGTH_SCATTER),
    high: ratio * (1 + STRENGTH_SCATTER),
    about: ABOUT_RATIO,
  };
}
