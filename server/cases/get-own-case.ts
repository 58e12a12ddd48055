import { parseCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import type { Viewer } from '#domain/viewer.ts';
import { readOwnCases, type OwnCase } from './read-own-cases.ts';

/**
 * Reads one of a customer's own cases. Throws NotFound for a number that is none, unknown, or another
 * customer's: the three cannot be told apart.
 */
export async function getOwnCase(
  viewer: Viewer,
  { number }: { number: string },
  { now = new Date() } = {},
): Promise<OwnCase> {
  const parsed = parseCaseNumber(number);
  const [own] = parsed ? await readOwnCases(viewer, parsed, { now }) : [];
  if (!own) throw new NotFound('No case has this number. Check it on the tag.');
  return own;
}
