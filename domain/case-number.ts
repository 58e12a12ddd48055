/** A case's number: the year its series belongs to, and its place in that year, from 1. */
export interface CaseNumber {
  year: number;
  ordinal: number;
}

/** Writes a case's number as people say it: `{ year: 2026, ordinal: 31 }` is "2026-031". */
export function formatCaseNumber({ year, ordinal }: CaseNumber): string {
  return `${year}-${formatOrdinal(ordinal)}`;
}

/** The part of the number that stands large on the tag: 31 is "031", 1204 is "1204". */
export function formatOrdinal(ordinal: number): string {
  return String(ordinal).padStart(3, '0');
}

/**
 * Reads a case's number. Returns null for anything that is not exactly as `formatCaseNumber` writes
 * it, so that one case has one address.
 */
export function parseCaseNumber(text: string): CaseNumber | null {
  const [, year, ordinal] = /^([1-9]\d{3})-(\d{3,9})$/.exec(text) ?? [];
  if (!year || !ordinal) return null;
  const number = { year: Number(year), ordinal: Number(ordinal) };
  return number.ordinal > 0 && formatCaseNumber(number) === text ? number : null;
}
