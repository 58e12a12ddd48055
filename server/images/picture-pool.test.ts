import { execFileSync } from 'node:child_process';
import { afterAll, describe, expect, it } from 'vitest';
import { aJpeg, aLargeJpeg, aPng } from '#tests/photos/pictures.ts';
import { type CannotDerive, PicturePool } from './picture-pool.ts';
import { PictureProcess } from './picture-process.ts';

const plenty = { memory: 2_000_000_000, time: 60_000 };
const pool = new PicturePool(1, plenty);
afterAll(() => pool.end());

/** Ids of this process's picture processes (ps(1)). */
function children(): number[] {
  const listed = execFileSync('ps', ['-o', 'pid=,args=', '--ppid', String(process.pid)]).toString();
  return listed
    .split('\n')
    .filter((line) => line.includes('derive-worker'))
    .map((line) => Number.parseInt(line, 10));
}

async function broken(): Promise<Buffer> {
  const png = await aPng();
  png.fill(0, png.indexOf('IDAT') + 4, png.length - 16);
  return png;
}

describe('a picture in a process of its own', () => {
  it('comes back with its copies, and others do while one cannot be read', async () => {
    const jpeg = await aJpeg({ width: 400, height: 300 });
    const [first, second, third] = await Promise.allSettled([
      pool.derive({ file: jpeg, type: 'image/jpeg' }),
      pool.derive({ file: await broken(), type: 'image/png' }),
      pool.derive({ file: jpeg, type: 'image/jpeg' }),
    ]);
    expect(first.status === 'fulfilled' && first.value.copies.map(({ edge }) => edge)).toEqual([
      2048, 960, 320,
    ]);
    expect(second.status === 'rejected' && (second.reason as CannotDerive).sentence).toBe(
      'This photo cannot be shown: the picture in it cannot be read. Take it off and add it again.',
    );
    expect(third.status === 'fulfilled' && third.value.width).toBe(400);
  });

  it('is one of at most as many as the pool has', async () => {
    const jpeg = await aJpeg();
    const all = Array.from({ length: 4 }, () => pool.derive({ file: jpeg, type: 'image/jpeg' }));
    await all[0];
    expect(children()).toHaveLength(1);
    await Promise.all(all);
  });

  it('has none of the server’s secrets and yields to the rest of the machine', async () => {
    await pool.derive({ file: await aJpeg(), type: 'image/jpeg' });
    const [pid = 0] = children();
    const environment = execFileSync('cat', [`/proc/${pid}/environ`]).toString();
    expect(environment).not.toMatch(/DATABASE_URL|S3_|SECRET|PEPPER/);
    expect(Number(execFileSync('ps', ['-o', 'ni=', '-p', String(pid)]))).toBeGreaterThanOrEqual(10);
  });
});

describe('a picture that wants too much', () => {
  it('memory', async () => {
    const greedy = new PicturePool(1, { ...plenty, memory: 150_000_000 });
    const file = await aLargeJpeg(1200, 800);
    await expect(greedy.derive({ file, type: 'image/jpeg' })).rejects.toMatchObject({
      code: 'picture-memory',
      sentence:
        'This photo cannot be shown: it needs too much memory. Take it off and add a smaller one.',
    });
  });

  it('time', async () => {
    const hasty = new PicturePool(1, { ...plenty, time: 1 });
    const file = await aLargeJpeg(1200, 800);
    await expect(hasty.derive({ file, type: 'image/jpeg' })).rejects.toMatchObject({
      code: 'picture-time',
    });
  });
});

describe('a picture process that is ended', () => {
  it('by something else is replaced, and the picture tried again', async () => {
    const file = await aLargeJpeg(1200, 800);
    const making = pool.derive({ file, type: 'image/jpeg' });
    const [pid = 0] = children();
    process.kill(pid, 'SIGKILL');
    expect((await making).width).toBe(1200);
  });

  it('says so, and is not used again', async () => {
    const killing = new PictureProcess();
    const asked = killing.derive({ file: await aJpeg(), type: 'image/jpeg' }, plenty);
    killing.end();
    expect(await asked).toBe('crash');
    expect(await killing.derive({ file: await aJpeg(), type: 'image/jpeg' }, plenty)).toBe('crash');
  });
});
