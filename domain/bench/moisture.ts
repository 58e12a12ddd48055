import { type About, type Band, bandByAmount } from './figure.ts';
import { within } from './within.ts';

export const ABOUT_MOISTURE: About = {
  formula: 'Wood Handbook, equilibrium moisture content',
  basis: 'published',
  source:
    'USDA Forest Products Laboratory, Wood Handbook, GTR-190, Table 4-2 and its equation; the Laboratory’s own later report (GTR-229) calls the data unreliable for scientific use',
};

/** Say "about": ± this much, % moisture content, and weeks to reach it. */
export const MOISTURE_ERROR_PCT = 1;

/**
 * Moisture content in % that wood tends to in air of this temperature and humidity.
 * M = (1800/W) [ K h/(1 − K h) + (K1 K h + 2 K1 K2 K² h²)/(1 + K1 K h + K1 K2 K² h²) ], h = RH/100,
 * W = 349 + 1.29 T + 0.0135 T², K = 0.805 + 0.000736 T − 0.00000273 T²,
 * K1 = 6.27 − 0.00938 T − 0.000303 T², K2 = 1.91 + 0.0407 T − 0.000293 T².
 * @param temperatureC −1.1 (30 °F) to 50 °C  @param humidityPct 5 to 95 %
 * @throws BadReading outside the table
 * Source: Wood Handbook, published; within 0.07 of Table 4-2. Band ±1 %; a hygrometer's ±3 % RH alone
 * is ±0.5 %.
 */
export function equilibriumMoisture(
  temperatureC: number,
  humidityPct: number,
): { moisturePct: number; band: Band; about: About } {
  const t = within('temperature', temperatureC);
  const h = within('humidity', humidityPct) / 100;
  const w = 349 + 1.29 * t + 0.0135 * t ** 2;
  const k = 0.805 + 0.000736 * t - 0.00000273 * t ** 2;
  const k1 = 6.27 - 0.00938 * t - 0.000303 * t ** 2;
  const k2 = 1.91 + 0.0407 * t - 0.000293 * t ** 2;
  const one = k1 * k * h;
  const two = k1 * k2 * (k * h) ** 2;
  const moisturePct = (1800 / w) * ((k * h) / (1 - k * h) + (one + 2 * two) / (1 + one + two));
  return {
    moisturePct,
    band: bandByAmount(moisturePct, MOISTURE_ERROR_PCT),
    about: ABOUT_MOISTURE,
  };
}
