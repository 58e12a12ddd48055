import { writeEntryBundle } from '#evidence/tiles/entry-bundle.ts';
import { entriesPath } from '#evidence/tiles/tile-path.ts';
import { keepLogObject } from './log-store.ts';
import { readLogEntries } from './read-log.ts';

const PER_BUNDLE = 256;

/**
 * Keeps the log's entries in the store, in bundles of 256 with the last one partial: what a restored
 * database can be compared with and filled up from.
 * @param from how many entries the store has under its last head; @param size how many it shall have
 */
export async function keepEntryBundles(from: number, size: number): Promise<void> {
  for (let n = Math.floor(from / PER_BUNDLE); n * PER_BUNDLE < size; n += 1) {
    const first = n * PER_BUNDLE;
    const width = Math.min(PER_BUNDLE, size - first);
    const entries = await readLogEntries(first, width);
    if (entries.length !== width) {
      throw new Error(`The witness log lacks entries from ${first} on. Run npm run log:check.`);
    }
    const bundle = writeEntryBundle(entries);
    await keepLogObject(`log/${entriesPath(n, width)}`, bundle, 'application/octet-stream');
  }
}
