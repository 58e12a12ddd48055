/** What the shop gives out about a number, to be checked here. */
export interface FetchedRecord {
  bundle: string;
  /** The log key published at this address now; null when none is. */
  logKeyId: string | null;
  /** Every log key published here, retired ones too. */
  logKeyIds: string[];
  /** The log's public entries under the record's head, when they are few enough to fetch. */
  entries: Uint8Array | null;
}

interface KeySet {
  keys: { kid: string; witnessmark: { use: string; status: string } }[];
}

/** Above this the public entries are not fetched: 67 bytes each, some 1.3 MB. */
const MOST_ENTRIES = 20_000;

const SILENT = 'The shop does not answer. Try again in a minute.';

async function ask(path: string): Promise<Response> {
  try {
    return await fetch(path);
  } catch {
    throw new Error(SILENT);
  }
}

async function refusal(answer: Response): Promise<Error> {
  const said = (await answer.json().catch(() => null)) as { sentence?: string } | null;
  return new Error(said?.sentence ?? SILENT);
}

/**
 * Fetches the record of a number, the keys published at this address and the log's public entries.
 * @param code eleven signs: all that is sent
 * @returns null when the number is not known
 * @throws Error with a sentence when the shop does not answer
 */
export async function fetchRecord(code: string): Promise<FetchedRecord | null> {
  const [record, published] = await Promise.all([ask(`/api/verify/${code}`), ask('/api/log/keys')]);
  if (record.status === 404) return null;
  if (!record.ok) throw await refusal(record);
  if (!published.ok) throw await refusal(published);
  const { bundle, size } = (await record.json()) as { bundle: string; size: number };
  const { keys } = (await published.json()) as KeySet;
  const logKeys = keys.filter(({ witnessmark }) => witnessmark.use === 'log');
  const current = logKeys.findLast(({ witnessmark }) => witnessmark.status === 'current');
  const entries = size <= MOST_ENTRIES ? await ask(`/api/log/entries?size=${size}`) : null;
  return {
    bundle,
    logKeyId: current?.kid ?? null,
    logKeyIds: logKeys.map(({ kid }) => kid),
    entries: entries?.ok ? new Uint8Array(await entries.arrayBuffer()) : null,
  };
}
