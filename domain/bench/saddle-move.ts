import { BadReading } from './bad-reading.ts';
import { type About, type Band, bandByShare } from './figure.ts';
import { centsBetween } from './pitch.ts';
import { plainAmount } from './plain-number.ts';
import { within } from './within.ts';

/** Natural logarithm of one cent. */
const LN_PER_CENT = Math.LN2 / 1200;

export interface SaddleMove {
  /** e S ln2/1200, mm; plus lengthens the string. */
  firstOrderMm: number;
  /** From the lengths as they are now, mm. */
  exactMm: number;
  /** Of the first order, ±20 %: an estimate. */
  band: Band;
  direction: 'lengthen' | 'shorten' | 'none';
  /** In the words of the bench: back is away from the nut. */
  words: 'back' | 'forward' | 'none';
  about: About;
}

const ABOUT_MOVE: About = {
  formula: 'move = cents × S × ln2/1200',
  basis: 'computed',
  source:
    'From the lengths of open and stopped string, stretch taken as unchanged; an estimate: retune, read again, repeat',
};

/**
 * Error of the octave at the 12th fret, in cents: 1200 log2(f12 / (2 f open)); sharp is plus.
 * @throws BadReading beyond ±50 cents: wrong note, wrong fret or bridge in the wrong place
 * Source: definition, computed. Error: twice the tuner's.
 */
export function octaveError(openHz: number, twelfthHz: number): number {
  return within('centsError', centsBetween(openHz, twelfthHz) - 1200);
}

/**
 * How far to move the saddle so that the 12th fret sounds the octave. Sharp lengthens (back, away
 * from the nut), flat shortens (forward).
 * First order: x = e S ln2/1200. Exact: x = (L0 − q L12)/(q − 1), L0 = S + c, L12 = S/2 + c,
 * q = (L0/L12) 2^(−e/1200).
 * @param scaleMm nominal scale length, mm
 * @param errorCents as `octaveError`, ±50
 * @param compensationMm c, how much further than S the saddle stands now, mm
 * @throws BadReading outside these ranges
 * Source: computed, checked by root finding. Band ±20 %, two rounds reach ±1 cent: common practice.
 */
export function saddleMove(scaleMm: number, errorCents: number, compensationMm = 0): SaddleMove {
  within('scale', scaleMm);
  within('centsError', errorCents);
  within('compensation', compensationMm);
  const open = scaleMm + compensationMm;
  const stopped = scaleMm / 2 + compensationMm;
  const ratio = (open / stopped) * 2 ** (-errorCents / 1200);
  const firstOrderMm = errorCents * scaleMm * LN_PER_CENT;
  return {
    firstOrderMm,
    // At 0 cents the closed form leaves a rounding error of its own; nothing is to move.
    exactMm: errorCents === 0 ? 0 : (open - ratio * stopped) / (ratio - 1),
    band: bandByShare(firstOrderMm, 0.2),
    direction: errorCents > 0 ? 'lengthen' : errorCents < 0 ? 'shorten' : 'none',
    words: errorCents > 0 ? 'back' : errorCents < 0 ? 'forward' : 'none',
    about: ABOUT_MOVE,
  };
}

/** What has to be settled before an intonation reading means anything, in the order of the work: common practice. */
export const BEFORE_INTONATION = ['strings', 'relief', 'nut', 'action'] as const;
export type BeforeIntonation = (typeof BEFORE_INTONATION)[number];

const NOT_SETTLED: Record<BeforeIntonation, string> = {
  strings: 'the new strings',
  relief: 'the relief',
  nut: 'the nut height',
  action: 'the action',
};

/**
 * Lets a saddle move through only for a reading taken after strings, relief, nut and action.
 * @param settled what was settled when the reading was taken
 * @throws BadReading `too-early`, naming what was not
 * Source: common practice; lowering the action by 1.5 mm can change the reading by 3 to 20 cents.
 */
export function demandSettled(settled: Record<BeforeIntonation, boolean>): void {
  const open = BEFORE_INTONATION.filter((step) => !settled[step]).map((step) => NOT_SETTLED[step]);
  if (open.length === 0) return;
  const list = open.length === 1 ? open[0] : `${open.slice(0, -1).join(', ')} and ${open.at(-1)}`;
  throw new BadReading({
    code: 'too-early',
    field: 'centsError',
    sentence: `Intonation: this was read before ${list}; each changes it by several cents. Settle that first, then read the 12th fret again.`,
  });
}

export interface SaddleTravel {
  /** How far the bearing point can still go back and forward, mm. */
  backMm: number;
  forwardMm: number;
}

/**
 * What is left of the saddle's travel after a move, mm in its direction.
 * @throws BadReading `impossible` when the move is longer than the travel, saying how much is left
 */
export function travelLeft(moveMm: number, travel: SaddleTravel): number {
  const available = moveMm >= 0 ? travel.backMm : travel.forwardMm;
  const left = available - Math.abs(moveMm);
  if (left >= 0) return left;
  const word = moveMm >= 0 ? 'back' : 'forward';
  throw new BadReading({
    code: 'impossible',
    field: 'saddleTravel',
    sentence: `Saddle: a move of ${plainAmount(Math.abs(moveMm), 'mm')} ${word} is asked and ${plainAmount(available, 'mm')} is left. Use what is left and read again, or move the bridge.`,
  });
}

/**
 * Cents by which a note of vibrating length L changes when L changes by x: −1200 log2(1 + x/L).
 * +1 mm on 647.7 mm is −2.671 cents.
 * @param lengthMm vibrating length, 50 to 1200 mm  @param changeMm ±50 mm
 * @throws BadReading outside these ranges
 * Source: f goes with 1/L, computed.
 */
export function lengthToCents(lengthMm: number, changeMm: number): number {
  within('vibratingLength', lengthMm);
  within('lengthChange', changeMm);
  return -1200 * Math.log2(1 + changeMm / lengthMm);
}
