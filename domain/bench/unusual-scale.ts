import type { Warning } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

export type ScaleFamily = 'mandolin' | 'violin family' | 'guitar' | 'bass';

/** Scale lengths met in each family, mm: common practice. */
export const USUAL_SCALES: Record<ScaleFamily, readonly [number, number]> = {
  mandolin: [330, 360],
  'violin family': [200, 700],
  guitar: [560, 700],
  bass: [700, 914],
};

/**
 * Says when a scale length, in mm, is accepted but unusual for its family, and whether doubling was
 * forgotten. null when it is usual. Source: common practice.
 * @throws BadReading when no instrument has such a scale.
 */
export function unusualScale(scaleMm: number, family: ScaleFamily): Warning | null {
  within('scale', scaleMm);
  const [low, high] = USUAL_SCALES[family];
  if (scaleMm >= low && scaleMm <= high) return null;
  const range = `${low} to ${plainAmount(high, 'mm')}`;
  const said = `Scale length: ${plainAmount(scaleMm, 'mm')} is unusual for this kind of instrument, ${range}.`;
  const doubled = scaleMm * 2;
  if (doubled >= low && doubled <= high) {
    return {
      code: 'not-doubled',
      sentence: `${said} Nut to 12th fret, doubled, would be ${plainAmount(doubled, 'mm')}: was the doubling left out?`,
    };
  }
  return {
    code: 'unusual-scale',
    sentence: `${said} Measure nut to 12th fret again and double it.`,
  };
}
