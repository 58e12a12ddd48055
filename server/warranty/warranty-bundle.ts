import { BUNDLE_FORMAT } from '#evidence/bundle/bundle-shape.ts';
import { writeBundle } from '#evidence/bundle/write-bundle.ts';
import { publicKeys } from '#server/evidence/current-key.ts';
import { readLogState } from '#server/evidence/log-state.ts';
import type { PublishedHead } from '#server/evidence/newest-checkpoint.ts';
import { bundleEntries } from './bundle-entries.ts';
import type { SealedWarranty } from './sealed-warranty.ts';
import { signedStanding } from './standing.ts';

/**
 * A warranty's record as a file (.witnessmark.json), under one published head: whoever has it can
 * check it without the shop.
 * @param withCredential whether it says what was done to which instrument; without, only that the
 *   number is known and what its standing is
 * @throws Error when the head does not cover the warranty
 */
export async function warrantyBundle(
  warranty: SealedWarranty,
  head: PublishedHead,
  { withCredential, now }: { withCredential: boolean; now: Date },
): Promise<string> {
  if (head.size <= warranty.leafIndex) throw new Error('The head does not cover this warranty.');
  const [{ origin }, keys, entries] = await Promise.all([
    readLogState(),
    publicKeys(),
    bundleEntries(warranty, head),
  ]);
  return writeBundle({
    format: BUNDLE_FORMAT,
    origin,
    vkeys: keys.flatMap(({ use, vkey }) => (use === 'log' && vkey ? [vkey] : [])),
    entries,
    credential: withCredential ? warranty.jws : null,
    stamps: [],
    consistency: [],
    standing: await signedStanding(warranty, head, now),
  });
}
