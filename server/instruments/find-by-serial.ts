import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { listInstrumentsOf, type KnownInstrument } from './list-instruments-of.ts';

/** What the counter learns from a serial. */
export interface SerialFound {
  /** This owner's instruments with the serial, with their history. */
  same: KnownInstrument[];
  /** The serial is on record with somebody else: nothing more is said of it. */
  asksForProof: boolean;
}

/**
 * Looks a serial up for the owner at the counter (`ownerId` null: a new customer). With the same owner
 * it shows the history; with another person it discloses only that proof will be asked for.
 */
export async function findBySerial(
  viewer: Viewer,
  { serial, ownerId }: { serial: string; ownerId: string | null },
): Promise<SerialFound> {
  demand(viewer, 'take in');
  const typed = serial.trim();
  if (typed === '') return { same: [], asksForProof: false };
  const others = await select<{ id: string }>(
    'SELECT id FROM instruments WHERE serial = :typed AND NOT owner_id <=> :ownerId LIMIT 1',
    { typed, ownerId },
  );
  const own = ownerId === null ? [] : await listInstrumentsOf(viewer, { ownerId });
  const matches = (known: KnownInstrument) => known.serial?.toLowerCase() === typed.toLowerCase();
  const same = own.filter(matches);
  return { same, asksForProof: same.length === 0 && others.length > 0 };
}
