import { randomBytes } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { rootOfLeaves } from '#evidence/merkle/root-of-leaves.ts';
import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { appendEntry, type NewEntry } from './append-entry.ts';
import { withNodes } from './log-nodes.ts';
import { openLog } from './open-log.ts';
import { recordClock } from './record-clock.ts';
import { readLogEntries } from './read-log.ts';
import { readLogState } from './log-state.ts';

useDatabase();

const START = new Date('2026-03-01T08:00:00.000Z');
const entry = (chain: Buffer, now: Date, more: Partial<NewEntry> = {}): NewEntry => ({
  chain,
  kind: 'authorisation',
  visibility: 'shared',
  occurredAt: null,
  parts: { shown: { v: 1, text: 'Authorised in person.' } },
  photos: [],
  names: [],
  now,
  ...more,
});
const append = (value: NewEntry) => transaction((tx) => appendEntry(tx, value));
const at = (minutes: number) => new Date(START.getTime() + minutes * 60_000);

beforeAll(() => openLog({ now: START }));

describe('appending', () => {
  it('opens with the log’s start and three keys in its own chain, and only once', async () => {
    await Promise.all([openLog({ now: START }), openLog({ now: START })]);
    const rows = await select<{ kind: string; seq: number; chain: Buffer; header: Buffer }>(
      'SELECT kind, seq, chain, header FROM sealed_entries ORDER BY leaf_index',
    );
    expect(rows.map(({ kind }) => kind)).toEqual(['log-start', 'key', 'key', 'key']);
    expect(rows.map(({ seq }) => seq)).toEqual([0, 1, 2, 3]);
    expect(rows.every(({ chain }) => chain.equals(Buffer.alloc(16)))).toBe(true);
    const { origin } = await readLogState();
    expect(origin).toMatch(/^witnessmark\/[0-9a-f]{12}4[0-9a-f]{3}[89ab][0-9a-f]{15}$/);
  });

  it('gives fifty at once a dense log whose root is that of its leaves', async () => {
    const before = (await readLogState()).size;
    const chains = Array.from({ length: 5 }, () => randomBytes(16));
    const done = await Promise.all(
      Array.from({ length: 50 }, (_, i) => append(entry(chains[i % 5]!, at(1)))),
    );
    const indexes = done.map(({ leafIndex }) => leafIndex).sort((a, b) => a - b);
    expect(indexes).toEqual(Array.from({ length: 50 }, (_, i) => before + i));
    const size = before + 50;
    expect((await readLogState()).size).toBe(size);
    const leaves = (await readLogEntries(0, size)).map((bytes) => leafHash(bytes));
    expect(leaves).toHaveLength(size);
    const root = await withNodes((read) => treeRoot(size, read));
    expect(Buffer.from(root)).toEqual(Buffer.from(rootOfLeaves(leaves)));
    for (const chain of chains) {
      const rows = await select<{ seq: number; commitment: Buffer; header: Buffer }>(
        'SELECT seq, commitment, header FROM sealed_entries WHERE chain = ? ORDER BY seq',
        [chain],
      );
      expect(rows.map(({ seq }) => seq)).toEqual(Array.from({ length: 10 }, (_, i) => i));
      const prevs = rows.map(({ header }) => readHeader(header).prev);
      const hexes = rows.map(({ commitment }) => commitment.toString('hex'));
      expect(prevs).toEqual([null, ...hexes.slice(0, -1)]);
    }
  });

  it('leaves nothing behind when its cause is rolled back', async () => {
    const before = await readLogState();
    await expect(
      transaction(async (tx) => {
        await appendEntry(tx, entry(randomBytes(16), at(2)));
        throw new Error('the cause failed');
      }),
    ).rejects.toThrow('the cause failed');
    expect(await readLogState()).toEqual(before);
  });

  it('never goes back in time: up to five minutes behind repeats, more is refused', async () => {
    const first = await append(entry(randomBytes(16), at(10)));
    const repeated = await append(entry(randomBytes(16), at(5)));
    expect(repeated.recordedAt).toEqual(first.recordedAt);
    await expect(append(entry(randomBytes(16), new Date(at(5).getTime() - 1)))).rejects.toThrow(
      'The server’s clock reads 2026-03-01T08:04:59.999Z, but the last entry was sealed at 2026-03-01T08:10:00.000Z. Set the clock right, then seal again; if it was wrong before, run npm run log:clock.',
    );
    expect((await append(entry(randomBytes(16), at(11)))).recordedAt).toEqual(at(11));
  });

  it('goes back in time only after the log says that the clock was wrong', async () => {
    await append(entry(randomBytes(16), at(1000)));
    const right = at(12);
    await expect(append(entry(randomBytes(16), right))).rejects.toThrow('npm run log:clock');
    await expect(recordClock({ reason: ' ' }, { now: right })).rejects.toThrow(
      'Why was the clock wrong? Say it in a few words.',
    );
    await recordClock({ reason: 'The battery of the server’s clock was flat.' }, { now: right });
    expect((await append(entry(randomBytes(16), right))).recordedAt).toEqual(right);
    const [row] = await select<{ bytes: Buffer }>(
      `SELECT p.bytes FROM sealed_entries s JOIN sealed_parts p ON p.leaf_index = s.leaf_index
       WHERE s.kind = 'clock'`,
    );
    expect(readPart('clock', 'shown', row!.bytes)).toMatchObject({
      old: at(1000).toISOString(),
      new: right.toISOString(),
    });
    await expect(recordClock({ reason: 'Again' }, { now: at(13) })).rejects.toThrow(
      'The clock is not behind the last sealed entry.',
    );
  });

  it('keeps an occurredAt far before the time it was recorded, both as they are', async () => {
    const { leafIndex } = await append(
      entry(randomBytes(16), at(12), { occurredAt: new Date('2025-11-02T10:00:00.000Z') }),
    );
    const [row] = await select<{ header: Buffer }>(
      'SELECT header FROM sealed_entries WHERE leaf_index = ?',
      [leafIndex],
    );
    const header = readHeader(row!.header);
    expect(header.occurredAt).toBe('2025-11-02T10:00:00.000Z');
    expect(header.recordedAt).toBe('2026-03-01T08:12:00.000Z');
  });

  it('refuses more than a hundred photos, a part that is too long, and a full case', async () => {
    const photo = (n: number) => ({
      n,
      visibility: 'shared' as const,
      originalSha256: randomBytes(32),
      publishedSha256: randomBytes(32),
    });
    const photos = Array.from({ length: 101 }, (_, i) => photo(i + 1));
    await expect(append(entry(randomBytes(16), at(13), { photos }))).rejects.toThrow(
      'This entry has 101 photos; 100 can be sealed together. Move some to another entry.',
    );
    const shown = { v: 1, text: 'x'.repeat(256 * 1024) };
    await expect(append(entry(randomBytes(16), at(13), { parts: { shown } }))).rejects.toThrow(
      'This entry is too long to be sealed. Split it into two entries.',
    );
    const chain = randomBytes(16);
    await append(entry(chain, at(13)));
    await run('UPDATE sealed_entries SET seq = 999 WHERE chain = ?', [chain]);
    await expect(append(entry(chain, at(13)))).rejects.toThrow(
      'A case holds at most 1000 sealed entries and this one is full.',
    );
  });
});
