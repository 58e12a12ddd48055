import { EncodingError } from '#evidence/errors.ts';

/**
 * Whether a text is an instant as it is sealed: `YYYY-MM-DDThh:mm:ss.sssZ`, in UTC, a day that
 * exists, never a leap second.
 */
export function isInstant(text: string): boolean {
  if (!/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/.test(text)) return false;
  const time = Date.parse(text);
  // 30 February and 24:00 parse to another instant than they spell.
  return !Number.isNaN(time) && new Date(time).toISOString() === text;
}

/**
 * The sealed text of a moment.
 * @throws EncodingError for an invalid date or a year that has not four digits
 */
export function toInstant(moment: Date): string {
  const text = Number.isNaN(moment.getTime()) ? '' : moment.toISOString();
  if (!isInstant(text)) throw new EncodingError('This moment cannot be written as an instant.');
  return text;
}
