import { v7 } from 'uuid';
import { afterEach, describe, expect, it } from 'vitest';
import { NotAllowed, Unavailable } from '#domain/errors.ts';
import { PUBLIC, type Viewer } from '#domain/viewer.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { run, select, transaction } from '../db/sql.ts';
import { backOff, MOST_ATTEMPTS } from './back-off.ts';
import { CLAIM_MS, claimJobs, renewClaim } from './claim-jobs.ts';
import { doJob } from './do-job.ts';
import { GiveUp } from './job.ts';
import { listTrouble } from './list-trouble.ts';
import { queueJob, type NewJob } from './queue-job.ts';
import { settleDone } from './settle-job.ts';

useDatabase();
afterEach(() => run('DELETE FROM outbox'));

const AT = new Date('2026-04-16T09:40:00.000Z');
const later = (ms: number) => new Date(AT.getTime() + ms);
const KIND = 'test-kind';

const queue = (job: Partial<NewJob> = {}) =>
  transaction((tx) => queueJob(tx, { kind: KIND, payload: { n: 1 }, ...job }, { now: AT }));
const claim = (most = 10, now = AT) => claimJobs([KIND], most, { now });

interface Row {
  attempts: number;
  due_at: Date;
  done_at: Date | null;
  failed_at: Date | null;
  last_error: string | null;
}
const row = async () => (await select<Row>('SELECT * FROM outbox'))[0] as Row;

describe('a job', () => {
  it('is there with its cause, or not at all', async () => {
    const failing = transaction(async (tx) => {
      await queueJob(tx, { kind: KIND, payload: {} });
      throw new Error('the cause did not happen');
    });
    await expect(failing).rejects.toThrow('did not happen');
    expect(await claim()).toEqual([]);
  });

  it('comes as it was queued, when it is due', async () => {
    await queue({ payload: { photo: 'a' }, dueAt: later(1_000) });
    expect(await claim(10, later(999))).toEqual([]);
    expect(await claim(10, later(1_000))).toMatchObject([
      { kind: KIND, payload: { photo: 'a' }, attempts: 1 },
    ]);
  });

  it('is queued once per key', async () => {
    const onceKey = v7();
    await queue({ onceKey });
    await queue({ onceKey, payload: { n: 2 } });
    await queue({ onceKey: null });
    await queue({ onceKey: null });
    expect(await claim()).toHaveLength(3);
  });

  it('is given to one worker of many that ask at the same time, and none waits', async () => {
    for (let n = 0; n < 12; n += 1) await queue({ payload: { n } });
    const claims = await Promise.all(Array.from({ length: 6 }, () => claim(3)));
    const ids = claims.flat().map(({ id }) => id);
    expect(new Set(ids).size).toBe(ids.length);
    const rest = await claim(12);
    expect(ids.length + rest.length).toBe(12);
  });

  it('goes to another worker when the first one died with it', async () => {
    await queue();
    const [first] = await claim();
    expect(await claim(10, later(CLAIM_MS - 1))).toEqual([]);
    const [second] = await claim(10, later(CLAIM_MS));
    expect(second).toMatchObject({ id: first?.id, attempts: 2 });
  });

  it('stays with a worker that takes long and says so', async () => {
    await queue();
    const [job] = await claim();
    await renewClaim(job?.id ?? '', { now: later(CLAIM_MS - 1) });
    expect(await claim(10, later(CLAIM_MS))).toEqual([]);
  });

  it('is done once', async () => {
    await queue();
    const [job] = await claim();
    if (job === undefined) throw new Error('nothing was claimed');
    await settleDone(job, { now: AT });
    expect(await claim(10, later(CLAIM_MS * 100))).toEqual([]);
    expect(await row()).toMatchObject({ done_at: AT, last_error: null });
  });
});

const staff: Viewer = {
  kind: 'staff',
  personId: v7(),
  role: 'desk',
  name: 'Ines Lund',
  number: 1,
  freshAt: AT,
};

describe('a job that fails', () => {
  async function fail(error: Error, attempt = 1) {
    await run('UPDATE outbox SET attempts = ?, due_at = ?', [attempt - 1, AT]);
    const [job] = await claim();
    if (job === undefined) throw new Error('nothing was claimed');
    return doJob(job, { now: AT, handler: () => Promise.reject(error) });
  }

  it('waits longer each time, at most an hour', () => {
    const waits = [1, 2, 3, 4, 5, 6, 7, 30].map(backOff);
    expect(waits).toEqual([5e3, 20e3, 80e3, 320e3, 1280e3, 3600e3, 3600e3, 3600e3]);
  });

  it('is tried again, and says why it was not done, without personal data', async () => {
    await queue();
    const error = Object.assign(new Error('cannot reach anna@example.org'), { code: 'ESOCKET' });
    expect(await fail(error, 2)).toBe(false);
    expect(await row()).toMatchObject({
      due_at: later(20_000),
      failed_at: null,
      last_error: 'ESOCKET',
    });
    expect(await claim(10, later(20_000))).toHaveLength(1);
  });

  it('keeps only a code of whatever was thrown', async () => {
    await queue();
    const codes = [];
    for (const error of [
      new Unavailable('store'),
      new TypeError('anna@example.org'),
      Object.assign(new Error('x'), { code: 'anna@example.org', name: 'to anna' }),
    ]) {
      await fail(error);
      codes.push((await row()).last_error);
    }
    expect(codes).toEqual(['store-unavailable', 'TypeError', 'unknown']);
  });

  it('is given up after a day of tries, and stays to be seen', async () => {
    await queue();
    await fail(new Error('x'), MOST_ATTEMPTS);
    expect(await row()).toMatchObject({ failed_at: AT, last_error: 'Error', done_at: null });
    expect(await claim(10, later(1e9))).toEqual([]);
    const day = Array.from({ length: MOST_ATTEMPTS - 1 }, (_, n) => backOff(n + 1));
    const hours = day.reduce((sum, ms) => sum + ms, 0) / 3_600_000;
    expect(hours).toBeGreaterThan(20);
    expect(hours).toBeLessThan(30);
  });

  it('is given up at once when trying again is useless', async () => {
    await queue();
    await fail(new GiveUp('bad-address'));
    expect(await row()).toMatchObject({ failed_at: AT, last_error: 'bad-address' });
  });

  it('is given up when nobody knows its kind', async () => {
    await queue();
    const [job] = await claim();
    if (job === undefined) throw new Error('nothing was claimed');
    expect(await doJob(job, { now: AT })).toBe(false);
    expect(await row()).toMatchObject({ last_error: 'no-handler', failed_at: AT });
  });

  it('is listed for the people of the shop, in words, until it is done', async () => {
    await queue();
    expect(await listTrouble(staff, { number: null })).toEqual([]);
    await fail(Object.assign(new Error('x'), { code: 'ESOCKET' }));
    const since = AT;
    expect(await listTrouble(staff, { number: null })).toEqual([
      {
        sentence: 'A task has not been done yet: ESOCKET. It is tried again by itself.',
        since,
        givenUp: false,
      },
    ]);
    expect(await listTrouble(staff, { number: '2026-031' })).toEqual([]);
    await fail(new GiveUp('bad-address'));
    expect((await listTrouble(staff, { number: null }))[0]?.givenUp).toBe(true);
    await run('UPDATE outbox SET done_at = ?', [AT]);
    expect(await listTrouble(staff, { number: null })).toEqual([]);
    for (const viewer of [PUBLIC, { kind: 'customer', customerId: v7(), name: 'C' } as const]) {
      await expect(listTrouble(viewer, { number: null })).rejects.toThrow(NotAllowed);
    }
  });
});
