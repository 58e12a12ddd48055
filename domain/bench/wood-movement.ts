import type { Basis } from './figure.ts';
import { within } from './within.ts';

/** How the rings lie to the width: quartersawn wood moves radially, flatsawn tangentially. */
export type Cut = 'radial' | 'tangential';

export interface WoodMovement {
  name: string;
  /** Change of size per % of moisture content, as a share of the width. */
  radial: number;
  tangential: number;
  basis: Basis;
  source: string;
}

/**
 * Movement per % of moisture from shrinkage S (green to ovendry, %): C = (S/30)/(1 − 20 S/30), S as a
 * share.
 * @param shrinkagePct 0.1 to 20 %  @throws BadReading outside
 * Source: reproduces the rows read of Wood Handbook Table 13-5 to 1.2e-5; published.
 */
export function movementFromShrinkage(shrinkagePct: number): number {
  const perPoint = within('shrinkage', shrinkagePct) / 100 / 30;
  return perPoint / (1 - 20 * perPoint);
}

const TABLE_13_5 = 'USDA Forest Products Laboratory, Wood Handbook, GTR-190, Table 13-5';

const read = (name: string, radial: number, tangential: number): WoodMovement => ({
  name,
  radial,
  tangential,
  basis: 'published',
  source: `${TABLE_13_5}; read`,
});

const shrunk = (name: string, radial: number, tangential: number, basis: Basis): WoodMovement => ({
  name,
  radial: movementFromShrinkage(radial),
  tangential: movementFromShrinkage(tangential),
  basis,
  source:
    `From shrinkage of ${radial} % radial and ${tangential} % tangential, ` +
    (basis === 'published' ? 'USDA technical sheet, read' : 'Wood Handbook Table 4-3, from memory'),
});

/** Woods with their movement per % of moisture content. */
export const WOOD_MOVEMENT = {
  'sugar maple': read('Sugar maple', 0.00165, 0.00353),
  'black walnut': read('Black walnut', 0.0019, 0.00274),
  'white ash': read('White ash', 0.00169, 0.00274),
  'black cherry': read('Black cherry', 0.00126, 0.00248),
  'red maple': read('Red maple', 0.00137, 0.00289),
  'bigleaf maple': read('Bigleaf maple', 0.00126, 0.00248),
  'American beech': read('American beech', 0.0019, 0.00431),
  'yellow birch': read('Yellow birch', 0.00256, 0.00338),
  'Sitka spruce': {
    name: 'Sitka spruce',
    radial: 0.00148,
    tangential: 0.00263,
    basis: 'from memory',
    source: 'Wood Handbook Table 13-5, softwoods; from memory',
  },
  'American mahogany': shrunk('American mahogany', 3, 4.1, 'published'),
  'western redcedar': shrunk('Western redcedar', 2.4, 5, 'from memory'),
} as const satisfies Record<string, WoodMovement>;

export type MovingWood = keyof typeof WOOD_MOVEMENT;
