import { afterEach, describe, expect, it, vi } from 'vitest';
import { useDatabase } from '#tests/setup/database.ts';
import { keepWorker } from './worker-process.ts';

useDatabase();

type Kept = ReturnType<typeof keepWorker>;
let kept: Kept | undefined;
afterEach(() => kept?.stop(5_000));

const isAlive = (pid: number) => {
  try {
    return process.kill(pid, 0);
  } catch {
    return false;
  }
};
const patience = { timeout: 15_000, interval: 50 };

async function pidOther(than?: number): Promise<number> {
  return vi.waitUntil(() => {
    const pid = kept?.pid();
    return pid === than ? undefined : pid;
  }, patience);
}

describe('the worker process', () => {
  it('is started again when it dies, and stops when asked', async () => {
    kept = keepWorker();
    const first = await pidOther();
    process.kill(first, 'SIGKILL');
    const second = await pidOther(first);
    expect(isAlive(second)).toBe(true);
    await kept.stop(5_000);
    expect(isAlive(second)).toBe(false);
    expect(kept.pid()).toBeUndefined();
  });
});
