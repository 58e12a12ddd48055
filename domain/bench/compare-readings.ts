import type { Warning } from './figure.ts';
import { plainAmount } from './plain-number.ts';
import { looksLikeInches } from './probable-meaning.ts';

/** What a set of readings was taken under. */
export interface ReadingConditions {
  /** Notes, thick to thin, as text: "E A D G B E". */
  tuning: string;
  a4Hz: number;
  /** Relative humidity, %, or null when it was not read. */
  humidityPct: number | null;
}

/** More than this between two readings moves neck and top enough to matter: common practice. */
const HUMIDITY_DIFFERENCE = 10;

/** Why two sets of readings, before and after, may not be laid side by side. Empty when they may. */
export function comparisonWarnings(before: ReadingConditions, after: ReadingConditions): Warning[] {
  const warnings: Warning[] = [];
  if (before.tuning !== after.tuning || before.a4Hz !== after.a4Hz) {
    warnings.push({
      code: 'other-tuning',
      sentence: `Before was read in ${before.tuning} at A4 = ${before.a4Hz} Hz, after in ${after.tuning} at A4 = ${after.a4Hz} Hz. Action and relief follow the pull; read both in one tuning.`,
    });
  }
  if (before.humidityPct !== null && after.humidityPct !== null) {
    const difference = Math.abs(after.humidityPct - before.humidityPct);
    if (difference > HUMIDITY_DIFFERENCE) {
      warnings.push({
        code: 'other-humidity',
        sentence: `The air differed by ${plainAmount(difference, '%')} between before and after. Part of the change may be the wood’s; read again when the room is as before.`,
      });
    }
  }
  return warnings;
}

/** Asks when one of two lengths looks as if it was read in inches; null when it does not. */
export function inchWarning(label: string, beforeMm: number, afterMm: number): Warning | null {
  if (!looksLikeInches(beforeMm, afterMm)) return null;
  return {
    code: 'inches',
    sentence: `${label}: ${plainAmount(beforeMm, 'mm')} before and ${plainAmount(afterMm, 'mm')} after are 25.4 to one. Was one of them read in inches? Check both.`,
  };
}
