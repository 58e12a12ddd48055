import { type ReadAs, type Reading, readReading } from './reading.ts';

export interface Gauge extends Reading {
  /** True for wound, false for plain, null when it was neither typed nor given. */
  wound: boolean | null;
}

const MARK = /\s*(wound|plain|w|p)\s*$/i;

/**
 * Reads a string gauge, with the letter the trade writes behind it: ".024w" is wound, ".016p" plain.
 * @param wound what is known without the letter
 * @throws BadReading as `readReading`; an 11 typed for .011 in comes back with `meant`.
 */
export function readGauge(text: string, as: ReadAs, wound: boolean | null = null): Gauge {
  const mark = MARK.exec(text)?.[1]?.toLowerCase();
  const kind = mark === undefined ? wound : mark.startsWith('w');
  const field = kind === null ? 'gauge' : kind ? 'woundGauge' : 'plainGauge';
  const reading = readReading(text.replace(MARK, ''), field, as);
  return { ...reading, typed: text.trim(), wound: kind };
}
