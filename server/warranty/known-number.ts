import type { StandingWord } from '#evidence/standing/standing-shape.ts';
import { currentKey } from '#server/evidence/current-key.ts';
import { newestHead } from '#server/evidence/newest-checkpoint.ts';
import { select } from '#server/db/sql.ts';
import { readShop } from '#server/shop/read-shop.ts';
import { noSoonerThan } from './no-sooner-than.ts';
import { countNumber } from './number-limit.ts';
import { sealedWarranty, type SealedWarranty } from './sealed-warranty.ts';
import { standingUnder } from './standing.ts';
import { subjectOf, type Subject } from './subject.ts';
import { unsafeWarranties } from './warranty.ts';

/** What anyone may know of a number the shop has issued. Nothing of it was checked by the reader. */
export interface KnownNumber {
  issuedAt: Date;
  validUntil: Date;
  standing: StandingWord;
  /** When the head was published that the standing is under. */
  headAt: Date;
  /** 64 hex. */
  sealValue: string;
  /** 32 hex. */
  logKeyId: string;
  /** Instrument, work and term; null where the owner lets only number and standing be shown. */
  subject: Subject | null;
}

/** Answers about known and unknown numbers alike are not given before this. */
const LEAST_MS = 120;

/** A handed-out warranty by its code, with what the owner lets be shown of it. */
export async function unsafeIssued(
  code: string,
): Promise<{ warranty: SealedWarranty; work: boolean } | null> {
  const [warranty] = await unsafeWarranties("w.code = :code AND w.step = 'issued'", { code });
  if (!warranty) return null;
  const [row] = await select<{ consent: 'number' | 'work' }>(
    'SELECT consent_publish AS consent FROM cases WHERE id = ?',
    [warranty.caseId],
  );
  return { warranty: await sealedWarranty(warranty), work: row?.consent === 'work' };
}

async function know(code: string, now: Date): Promise<KnownNumber | null> {
  const [issued, head, key] = await Promise.all([
    unsafeIssued(code),
    newestHead(),
    currentKey('log'),
  ]);
  if (!issued || !head) return null;
  const { warranty, work } = issued;
  return {
    issuedAt: warranty.issuedAt ?? warranty.drawnAt,
    validUntil: warranty.validUntil,
    standing: await standingUnder(warranty, head, now),
    headAt: head.madeAt,
    sealValue: warranty.seal.toString('hex'),
    logKeyId: key.id,
    subject: work ? await subjectOf(warranty) : null,
  };
}

/**
 * Whether the shop has issued a number, for anyone who asks. Says nothing about a paper: a number can
 * be copied.
 * @param code eleven signs; @param ip who asks, for counting
 * @returns null when the number is not known, no sooner than for a known one
 * @throws TooMany when too many were asked for from there
 */
export async function knownNumber(
  { code, ip }: { code: string; ip: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<KnownNumber | null> {
  await countNumber(ip);
  return noSoonerThan(LEAST_MS, know(code, now));
}

/** The shop's name and zone, for the page that answers. */
export async function whoAnswers(): Promise<{ shop: string; place: string; zone: string }> {
  const { name, place, timeZone } = await readShop();
  return { shop: name, place, zone: timeZone };
}
