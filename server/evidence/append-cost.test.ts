import { randomBytes } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { appendEntry } from './append-entry.ts';
import { withNodes } from './log-nodes.ts';
import { openLog } from './open-log.ts';

useDatabase();

const AT = new Date('2026-03-01T08:00:00.000Z');

/** Rows the connection has read and written so far, as the storage engine counts them. */
async function rowsTouched(tx: Transaction): Promise<number> {
  const rows = await select<{ Variable_name: string; Value: string }>(
    "SHOW SESSION STATUS LIKE 'Handler\\_%'",
    [],
    tx,
  );
  const counted =
    /^Handler_(read_(key|next|prev|first|last|rnd|rnd_next|deleted)|write|update|delete)$/;
  return rows
    .filter(({ Variable_name }) => counted.test(Variable_name))
    .reduce((sum, { Value }) => sum + Number(Value), 0);
}

/** What reading the counters costs by itself, in the same connection. */
async function costOf(work: (tx: Transaction) => Promise<unknown>): Promise<number> {
  return transaction(async (tx) => {
    const first = await rowsTouched(tx);
    const before = await rowsTouched(tx);
    await work(tx);
    return (await rowsTouched(tx)) - before - (before - first);
  });
}

/** Makes the log `size` long with nodes of random hashes: only their number matters here. */
async function growTo(size: number, from: number): Promise<void> {
  const rows: [number, number][] = [];
  for (let level = 0; 2 ** level <= size; level += 1) {
    for (let n = Math.floor(from / 2 ** level); n < Math.floor(size / 2 ** level); n += 1) {
      rows.push([level, n]);
    }
  }
  for (let i = 0; i < rows.length; i += 2000) {
    const some = rows.slice(i, i + 2000);
    await run(
      `INSERT INTO log_nodes (level, node_index, hash) VALUES ${some.map(() => '(?, ?, ?)').join(', ')}`,
      some.flatMap(([level, n]) => [level, n, randomBytes(32)]),
    );
  }
  await run('UPDATE log_states SET size = ?', [size]);
}

const append = (tx: Transaction) =>
  appendEntry(tx, {
    chain: randomBytes(16),
    kind: 'authorisation',
    visibility: 'shared',
    occurredAt: null,
    parts: { shown: { v: 1, text: 'Authorised in person.' } },
    photos: [],
    names: [],
    now: AT,
  });

// One less than a power of two is the worst case: the append completes a node on every level.
const SIZES = [2 ** 8 - 1, 2 ** 11 - 1, 2 ** 14 - 1];
const costs: { size: number; append: number; inclusion: number; consistency: number }[] = [];

beforeAll(async () => {
  await openLog({ now: AT });
  let from = 4;
  for (const size of SIZES) {
    await growTo(size, from);
    costs.push({
      size,
      inclusion: await costOf((tx) => withNodes((read) => proveInclusion(1, size, read), tx)),
      consistency: await costOf((tx) => withNodes((read) => proveConsistency(5, size, read), tx)),
      append: await costOf(append),
    });
    from = size + 1;
  }
});

describe('rows read and written', () => {
  // At least one: counters that stand still would pass every bound below.
  it.each(['append', 'inclusion', 'consistency'] as const)(
    'per %s are at most 2 log2 n and a constant',
    (act) => {
      for (const { size, ...cost } of costs) {
        expect(cost[act]).toBeGreaterThan(Math.log2(size));
        expect(cost[act]).toBeLessThanOrEqual(2 * Math.log2(size) + 24);
      }
    },
  );

  it('grow with the logarithm, not with the log', () => {
    const [small, , large] = costs;
    const levels = Math.log2(large!.size + 1) - Math.log2(small!.size + 1);
    expect(large!.append - small!.append).toBeLessThanOrEqual(2 * levels);
    expect(large!.inclusion - small!.inclusion).toBeLessThanOrEqual(2 * levels);
  });
});
