import { writeEntryBundle } from '#evidence/tiles/entry-bundle.ts';
import { readLogEntries } from './read-log.ts';

const AT_ONCE = 1024;

/** The log's first `size` entries as joined entry bundles (C2SP tlog-tiles), a piece at a time. */
export async function* streamEntries(size: number): AsyncGenerator<Uint8Array> {
  for (let from = 0; from < size; from += AT_ONCE) {
    yield writeEntryBundle(await readLogEntries(from, Math.min(AT_ONCE, size - from)));
  }
}
