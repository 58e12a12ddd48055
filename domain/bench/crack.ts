import type { About, Band, Warning } from './figure.ts';
import { equilibriumMoisture, MOISTURE_ERROR_PCT } from './moisture.ts';
import { within } from './within.ts';
import { type Cut, type MovingWood, WOOD_MOVEMENT } from './wood-movement.ts';

/** Moisture contents between which the coefficients hold, %: Wood Handbook, chapter 13. */
const VALID_PCT = [6, 14] as const;

const ABOUT_CRACK: About = {
  formula: 'ΔD = D C (M end − M start)',
  basis: 'published',
  source:
    'Wood Handbook, GTR-190, Eq. 13-2; an upper bound: a plate held all round opens a crack by at most this',
};

/**
 * Change of width in mm across the grain between two moisture contents: ΔD = D C (M_end − M_start);
 * drying is minus. Read it as the most a crack can open or close.
 * @param widthMm 1 to 1000 mm  @param perPct C, share per % of moisture, see WOOD_MOVEMENT
 * @throws BadReading outside these ranges
 * Source: Wood Handbook Eq. 13-2, valid from 6 to 14 %, published; `movementWarnings` says when outside.
 */
export function widthChange(
  widthMm: number,
  perPct: number,
  startPct: number,
  endPct: number,
): number {
  within('woodWidth', widthMm);
  within('movement', perPct);
  return widthMm * perPct * (within('moisture', endPct) - within('moisture', startPct));
}

/** Says when a moisture content lies outside what the coefficients were found for. */
export function movementWarnings(startPct: number, endPct: number): Warning[] {
  const [low, high] = VALID_PCT;
  if ([startPct, endPct].every((pct) => pct >= low && pct <= high)) return [];
  return [
    {
      code: 'outside-coefficients',
      sentence: `The wood goes outside ${low} to ${high} % moisture, where the coefficients hold. Take the figure as rough.`,
    },
  ];
}

export interface Air {
  temperatureC: number;
  humidityPct: number;
}

export interface CrackMovement {
  startMoisturePct: number;
  endMoisturePct: number;
  /** Across the grain, mm; minus is narrower: the crack opens. */
  changeMm: number;
  /** From ±1 % of moisture at each end. */
  band: Band;
  warnings: Warning[];
  about: About;
}

/**
 * The most a piece across the grain moves when the air goes from `start` to `end` and the wood follows,
 * which takes weeks.
 * @throws BadReading for air outside the moisture table or a width out of range
 * Source: equilibrium moisture and Eq. 13-2 of the Wood Handbook, published; the coefficient carries
 * its own basis in WOOD_MOVEMENT.
 */
export function crackMovement(
  widthMm: number,
  wood: MovingWood,
  cut: Cut,
  start: Air,
  end: Air,
): CrackMovement {
  const startMoisturePct = equilibriumMoisture(start.temperatureC, start.humidityPct).moisturePct;
  const endMoisturePct = equilibriumMoisture(end.temperatureC, end.humidityPct).moisturePct;
  const perPct = WOOD_MOVEMENT[wood][cut];
  const changeMm = widthChange(widthMm, perPct, startMoisturePct, endMoisturePct);
  // The errors of the two ends are taken as independent: root of the sum of squares.
  const errorMm = widthMm * perPct * MOISTURE_ERROR_PCT * Math.SQRT2;
  return {
    startMoisturePct,
    endMoisturePct,
    changeMm,
    band: { low: changeMm - errorMm, high: changeMm + errorMm },
    warnings: movementWarnings(startMoisturePct, endMoisturePct),
    about: ABOUT_CRACK,
  };
}
