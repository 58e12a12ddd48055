import { afterEach, describe, expect, it, vi } from 'vitest';
import { useDatabase } from '#tests/setup/database.ts';
import { run, select, transaction } from '../db/sql.ts';
import { handlers } from './handlers.ts';
import { queueJob } from './queue-job.ts';
import { startWork } from './work-loop.ts';

useDatabase();

const KIND = 'test-kind';
const patience = { timeout: 10_000, interval: 20 };
let work: ReturnType<typeof startWork> | undefined;

afterEach(async () => {
  await work?.stop();
  delete handlers[KIND];
  await run('DELETE FROM outbox');
});

const queue = (n: number) => transaction((tx) => queueJob(tx, { kind: KIND, payload: { n } }));
const done = async () => (await select('SELECT id FROM outbox WHERE done_at IS NOT NULL')).length;

describe('a worker at work', () => {
  it('does what is queued before it starts and after', async () => {
    const seen: unknown[] = [];
    handlers[KIND] = (payload) => Promise.resolve(void seen.push(payload));
    await queue(1);
    work = startWork();
    await vi.waitUntil(async () => (await done()) === 1, patience);
    await queue(2);
    await vi.waitUntil(async () => (await done()) === 2, patience);
    expect(seen).toEqual([{ n: 1 }, { n: 2 }]);
  });

  it('does one of a kind at a time, and finishes it before it stops', async () => {
    let atOnce = 0;
    let most = 0;
    const releases: (() => void)[] = [];
    handlers[KIND] = async () => {
      most = Math.max(most, (atOnce += 1));
      await new Promise<void>((resolve) => releases.push(resolve));
      atOnce -= 1;
    };
    await queue(1);
    await queue(2);
    work = startWork();
    await vi.waitUntil(() => releases.length === 1, patience);
    const stopped = work.stop();
    releases[0]?.();
    await stopped;
    expect(most).toBe(1);
    expect(await done()).toBe(1);
  });
});
