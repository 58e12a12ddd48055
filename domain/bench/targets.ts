import type { Basis } from './figure.ts';

/** From, to; mm. */
export type Range = readonly [number, number];

/** All of this file: common practice, to be agreed with the player. */
export const TARGETS_BASIS: Basis = 'common practice';
export const TARGETS_NOTE = 'common practice, agree with the player';

export interface ActionTarget {
  /** Lowest and highest string; for the violin family G and E, or C and A. */
  bassMm: Range;
  trebleMm: Range;
  /** Where it is read: string bottom to fret top, or to the end of the board. */
  at: '12th fret' | 'end of the board';
}

export const ACTION_TARGETS = {
  electric: { bassMm: [1.6, 2.0], trebleMm: [1.2, 1.6], at: '12th fret' },
  'steel acoustic': { bassMm: [2.2, 2.8], trebleMm: [1.6, 2.2], at: '12th fret' },
  classical: { bassMm: [3.5, 4.2], trebleMm: [2.8, 3.2], at: '12th fret' },
  bass: { bassMm: [2.0, 2.8], trebleMm: [1.6, 2.4], at: '12th fret' },
  mandolin: { bassMm: [1.6, 2.2], trebleMm: [1.2, 1.6], at: '12th fret' },
  violin: { bassMm: [4.5, 5.5], trebleMm: [3.0, 3.5], at: 'end of the board' },
  cello: { bassMm: [7, 8], trebleMm: [5, 6], at: 'end of the board' },
} as const satisfies Record<string, ActionTarget>;

export const RELIEF_TARGETS_MM = {
  guitar: [0.1, 0.3],
  bass: [0.25, 0.4],
  violin: [0.3, 0.75],
  cello: [1, 2],
} as const satisfies Record<string, Range>;

/** Where a reading stands against a target; both ends count as inside. */
export function againstTarget(valueMm: number, [low, high]: Range): 'below' | 'inside' | 'above' {
  if (valueMm < low) return 'below';
  return valueMm > high ? 'above' : 'inside';
}
