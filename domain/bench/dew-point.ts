import type { About } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

const A = 17.625;
const B = 243.04;

export const ABOUT_DEW_POINT: About = {
  formula: 'g = ln(RH/100) + 17.625 T/(243.04 + T); dew point = 243.04 g/(17.625 − g)',
  basis: 'from memory',
  source:
    'Magnus form, Alduchov and Eskridge 1996 (from memory); within 0.03 °C of two outside programs over water',
};

/**
 * Pressure in Pa of saturated water vapour over water: 610.94 exp(17.625 t/(243.04 + t)).
 * @param temperatureC −1.1 to 50 °C  @throws BadReading outside
 * Source: Magnus form, from memory; within 0.4 % of the ASHRAE table (published) from 0 to 50 °C.
 */
export function saturationPressure(temperatureC: number): number {
  within('temperature', temperatureC);
  return 610.94 * Math.exp((A * temperatureC) / (B + temperatureC));
}

/**
 * Dew point in °C over water; null below 0 °C, the frost region, where it is not given.
 * @param temperatureC −1.1 to 50 °C  @param humidityPct 1 to 100 %
 * @throws BadReading outside these ranges
 * Source: Magnus form, from memory; checked to 0.05 °C. Band: ±3 % RH is about ±1 °C.
 */
export function dewPoint(temperatureC: number, humidityPct: number): number | null {
  within('temperature', temperatureC);
  within('airHumidity', humidityPct);
  const g = Math.log(humidityPct / 100) + (A * temperatureC) / (B + temperatureC);
  const dewPointC = (B * g) / (A - g);
  return dewPointC < 0 ? null : dewPointC;
}

/**
 * Whether an instrument or case of this temperature gets wet in a room, with what to do; null when it
 * stays dry.
 * @throws BadReading for air out of range
 */
export function wetsInRoom(
  caseTemperatureC: number,
  room: { temperatureC: number; humidityPct: number },
): { dewPointC: number; sentence: string } | null {
  const dewPointC = dewPoint(room.temperatureC, room.humidityPct);
  if (dewPointC === null || caseTemperatureC >= dewPointC) return null;
  return {
    dewPointC,
    sentence: `The case is at ${plainAmount(caseTemperatureC, '°C')} and this room’s dew point is ${plainAmount(Number(dewPointC.toFixed(1)), '°C')}: what is opened now gets wet. Leave it shut until it is as warm as the room.`,
  };
}
