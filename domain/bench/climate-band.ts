import type { Basis, Warning } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

/** Air an instrument is at ease in, °C and % RH: common practice. */
export const SAFE_AIR = { temperatureC: [18, 24], humidityPct: [45, 55] } as const;
/** Humidity it puts up with, %: common practice. */
export const TOLERABLE_HUMIDITY_PCT = [40, 60] as const;
/** Below and above these damage is likely, %: common practice. */
export const HARMFUL_HUMIDITY_PCT = [35, 65] as const;

export interface ClimateJudgement {
  standing: 'safe' | 'tolerable' | 'outside';
  warnings: Warning[];
  basis: Basis;
}

/**
 * How the air at the bench stands against the safe band, 45 to 55 % and 18 to 24 °C. Slow change
 * matters more than the number.
 * @param temperatureC −1.1 to 50 °C  @param humidityPct 1 to 100 %
 * @throws BadReading outside these ranges
 * Source: common practice.
 */
export function judgeClimate(temperatureC: number, humidityPct: number): ClimateJudgement {
  within('temperature', temperatureC);
  within('airHumidity', humidityPct);
  const warm = between(temperatureC, SAFE_AIR.temperatureC);
  const warnings = [...humidityWarnings(humidityPct)];
  if (!warm) {
    warnings.push({
      code: 'temperature',
      sentence: `${plainAmount(temperatureC, '°C')} is outside 18 to 24 °C. Bring room and parts into it before glue or finish, slowly.`,
    });
  }
  const safe = warm && between(humidityPct, SAFE_AIR.humidityPct);
  const tolerable = warm && between(humidityPct, TOLERABLE_HUMIDITY_PCT);
  return {
    standing: safe ? 'safe' : tolerable ? 'tolerable' : 'outside',
    warnings,
    basis: 'common practice',
  };
}

function humidityWarnings(humidityPct: number): Warning[] {
  const said = plainAmount(humidityPct, '%');
  const [dry, damp] = HARMFUL_HUMIDITY_PCT;
  if (humidityPct < dry) {
    return [
      {
        code: 'dry',
        sentence: `${said}: dryness damage likely. Humidify slowly; do not glue cracks until it has risen.`,
      },
    ];
  }
  if (humidityPct > damp) {
    return [
      {
        code: 'damp',
        sentence: `${said}: swelling, mould, hide glue softening. Dry the room slowly.`,
      },
    ];
  }
  if (between(humidityPct, TOLERABLE_HUMIDITY_PCT)) return [];
  return [
    {
      code: 'humidity',
      sentence: `${said} is outside 40 to 60 %. Bring it back slowly; slow change matters more than the number.`,
    },
  ];
}

function between(value: number, [low, high]: readonly [number, number]): boolean {
  return value >= low && value <= high;
}
