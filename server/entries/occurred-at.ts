import { readClock } from '#domain/calendar.ts';
import { Invalid } from '#domain/errors.ts';

const FIELD = 'draft.occurredClock';

/** A phone's clock may run ahead of the server's by this much, ms. */
const AHEAD = 5 * 60_000;

/**
 * The instant of a typed clock time in the shop's zone; null for none. Throws Invalid for a time the
 * clocks skipped or showed twice, and for one still to come.
 */
export function occurredAt(clock: string | null, zone: string, now: Date): Date | null {
  if (clock === null) return null;
  const refuse = (sentence: string) => new Invalid({ [FIELD]: sentence });
  const meaning = read(clock, zone);
  switch (meaning?.kind) {
    case 'one':
      if (meaning.at.getTime() > now.getTime() + AHEAD)
        throw refuse('This time is still to come. Write when it happened.');
      return meaning.at;
    case 'twice':
      throw refuse(
        'The clocks went back and showed this time twice. Write a time outside that hour, and say it in the note.',
      );
    case 'never':
      throw refuse('The clocks went forward and never showed this time. Write the time after it.');
    case undefined:
      throw refuse('This is no date and time. Choose both, or leave it empty for now.');
  }
}

function read(clock: string, zone: string) {
  try {
    return readClock(clock, zone);
  } catch (error) {
    if (error instanceof RangeError) return null;
    throw error;
  }
}
