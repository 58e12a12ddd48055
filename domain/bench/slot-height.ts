import { BadReading } from './bad-reading.ts';
import type { About, Warning } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

/** Clearance over fret 1 to aim at with the string held at fret 3, mm: common practice. */
export const SLOT_CLEARANCE_TARGET_MM = [0.02, 0.15] as const;

const ABOUT_SLOT: About = {
  formula: 'clearance = H (x_k − x_1) / x_k',
  basis: 'computed',
  source: 'Similar triangles; the target of 0.02 to 0.15 mm held at fret 3 is common practice',
};

/**
 * Share of the slot's height that is left over fret 1 when the string is held at fret k:
 * (x_k − x_1)/x_k = 1 − (1 − 2^(−1/12))/(1 − 2^(−k/12)); the scale length drops out.
 * @param heldAtFret 2 or 3
 * @throws BadReading for another fret
 */
export function slotFactor(heldAtFret: number): number {
  if (heldAtFret !== 2 && heldAtFret !== 3) {
    throw new BadReading({
      code: 'out-of-range',
      field: 'heldAtFret',
      sentence: `Held at fret: ${plainAmount(heldAtFret, '')} is not used for this. Hold the string at fret 2 or 3.`,
      range: { min: 2, max: 3, unit: '' },
    });
  }
  return 1 - (1 - 2 ** (-1 / 12)) / (1 - 2 ** (-heldAtFret / 12));
}

export interface SlotClearance {
  /** Clearance over fret 1, mm. */
  clearanceMm: number;
  factor: number;
  warnings: Warning[];
  about: About;
}

/**
 * Clearance in mm over fret 1 with the string held at fret 2 or 3, from the height H of the slot
 * bottom above the plane of the fret tops: H (x_k − x_1)/x_k, factor 0.64724 (k = 3), 0.48556 (k = 2).
 * @param slotMm H, 0 to 1 mm  @throws BadReading outside; below 0 the slot is to be filled and recut
 * Source: similar triangles, computed; target common practice. Feelers: ±0.02 mm.
 */
export function slotClearance(slotMm: number, heldAtFret = 3): SlotClearance {
  within('slot', slotMm);
  const factor = slotFactor(heldAtFret);
  const clearanceMm = slotMm * factor;
  return {
    clearanceMm,
    factor,
    warnings: heldAtFret === 3 ? clearanceWarnings(clearanceMm) : [],
    about: ABOUT_SLOT,
  };
}

/** What a clearance over fret 1, in mm and held at fret 3, calls for; empty within the target. Common practice. */
export function clearanceWarnings(clearanceMm: number): Warning[] {
  const [low, high] = SLOT_CLEARANCE_TARGET_MM;
  const said = `${plainAmount(clearanceMm, 'mm')} over fret 1, held at fret 3`;
  if (clearanceMm < low) {
    return [
      {
        code: 'slot-low',
        sentence: `${said}: just visible is wanted, never touching. It may buzz open; fill and recut.`,
      },
    ];
  }
  if (clearanceMm > high) {
    return [
      {
        code: 'slot-high',
        sentence: `${said}: more than ${plainAmount(high, 'mm')}. The first frets will read sharp; deepen the slot.`,
      },
    ];
  }
  return [];
}
