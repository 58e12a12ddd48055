import { newestHead } from '#server/evidence/newest-checkpoint.ts';
import { unsafeIssued } from './known-number.ts';
import { noSoonerThan } from './no-sooner-than.ts';
import { countNumber } from './number-limit.ts';
import { warrantyBundle } from './warranty-bundle.ts';

/** The record that anyone may check, and the size of the head it is under. */
export interface PublicRecord {
  bundle: string;
  size: number;
}

const LEAST_MS = 250;

async function build(code: string, now: Date): Promise<PublicRecord | null> {
  const [issued, head] = await Promise.all([unsafeIssued(code), newestHead()]);
  if (!issued || !head) return null;
  const { warranty, work } = issued;
  const bundle = await warrantyBundle(warranty, head, { withCredential: work, now });
  return { bundle, size: head.size };
}

/**
 * The record of a number, to be checked where it is asked for: without its credential where the owner
 * lets only number and standing be shown.
 * @returns null when the number is not known, no sooner than for a known one
 * @throws TooMany when too many were asked for from there
 */
export async function publicRecord(
  { code, ip }: { code: string; ip: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<PublicRecord | null> {
  await countNumber(ip);
  return noSoonerThan(LEAST_MS, build(code, now));
}
