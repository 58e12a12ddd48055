import { buffer } from 'node:stream/consumers';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { run, select } from '#server/db/sql.ts';
import { picturePool } from '#server/images/picture-pool.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import { getStream } from '#server/storage/objects.ts';
import { withExif } from '#tests/photos/exif.ts';
import { heicShell } from '#tests/photos/heic.ts';
import { aJpeg } from '#tests/photos/pictures.ts';
import { inPieces, sent, sha256Of, whatIsKept } from '#tests/photos/sending.ts';
import { ownStore } from '#tests/record/own-store.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { derivePhoto } from './derive-photo.ts';
import { putPhoto } from './put-photo.ts';
import { sweepObjects } from './sweep-objects.ts';

const store = await ownStore();
useDatabase();

let shop: TestShop;
let repair: TestCase;
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
});
afterEach(() => store.fault({ kind: 'none' }));
afterAll(() => picturePool.end());

const LATER = new Date(Date.now() + 24 * 60 * 60 * 1000);
const drain = () => runDueJobs({ kinds: ['derive-photo'], now: LATER });

let salt = 100;
async function taken(file?: Buffer, mediaType = 'image/jpeg'): Promise<string> {
  const photo = file ?? (await aJpeg({ width: 480, height: 320, salt: (salt += 1) }));
  const input = sent(repair.number, photo, { mediaType });
  return (await putPhoto(shop.technician, input, inPieces(photo))).photo.id;
}

const rowOf = async (id: string) => {
  const [row] = await select<Record<string, unknown>>('SELECT * FROM photos WHERE id = ?', [id]);
  return row ?? {};
};
const copiesOf = (id: string) =>
  select<{ edge: number; object_key: string; sha256: Buffer; bytes: number; width: number }>(
    'SELECT * FROM photo_copies WHERE photo_id = ? ORDER BY edge DESC',
    [id],
  );
const versionOf = async () => {
  const [row] = await select<{ version: string }>('SELECT version FROM cases WHERE id = ?', [
    repair.id,
  ]);
  return Number(row?.version);
};

describe('the job of a photo', () => {
  it('stores three copies, writes down what the camera said, and tells open pages', async () => {
    const file = withExif(await aJpeg({ width: 480, height: 320 }), {
      orientation: 6,
      time: '2026:03:08 01:59:59',
      offset: '-05:00',
      fraction: '250',
      latitude: [12, 30, 15],
    });
    const id = await taken(file);
    const version = await versionOf();
    expect(await drain()).toEqual({ done: 1, failed: 0 });
    expect(await rowOf(id)).toMatchObject({
      state: 'ready',
      failed_because: null,
      width: 320,
      height: 480,
      taken_clock: '2026-03-08T01:59:59.250',
      taken_offset: '-05:00',
      taken_at: new Date('2026-03-08T06:59:59.250Z'),
      has_position: 1,
    });
    expect((await rowOf(id)).placeholder).toBeInstanceOf(Buffer);
    const copies = await copiesOf(id);
    expect(copies.map(({ edge, width }) => [edge, width])).toEqual([
      [2048, 320],
      [960, 320],
      [320, 213],
    ]);
    for (const copy of copies) {
      const stored = await getStream(copy.object_key);
      const bytes = stored && (await buffer(stored));
      expect(bytes && sha256Of(bytes)).toBe(copy.sha256.toString('hex'));
      expect(bytes).toHaveLength(copy.bytes);
    }
    expect(await versionOf()).toBeGreaterThan(version);
  });

  it('keeps a clock time without a zone as just that', async () => {
    const id = await taken(withExif(await aJpeg(), { time: '2026:03:08 01:59:59' }));
    await drain();
    expect(await rowOf(id)).toMatchObject({
      taken_clock: '2026-03-08T01:59:59',
      taken_offset: null,
      taken_at: null,
      has_position: 0,
    });
  });

  it('changes nothing when it is done again, or twice at once', async () => {
    const id = await taken();
    await Promise.all([derivePhoto({ photoId: id }), derivePhoto({ photoId: id })]);
    expect((await rowOf(id)).state).toBe('ready');
    const before = await whatIsKept();
    await derivePhoto({ photoId: id });
    expect(await whatIsKept()).toEqual(before);
    expect(await sweepObjects({ now: LATER })).toBe(0);
  });

  it('marks a picture that cannot be decoded, and the others go on', async () => {
    const bad = await taken(heicShell(), 'image/heic');
    const good = await taken();
    expect((await drain()).failed).toBe(0);
    expect(await rowOf(bad)).toMatchObject({
      state: 'failed',
      failed_because:
        'This photo cannot be shown: the picture in it cannot be read. Take it off and add it again.',
    });
    expect((await rowOf(good)).state).toBe('ready');
    const original = await getStream(String((await rowOf(bad)).object_key));
    expect(original && (await buffer(original)).equals(heicShell())).toBe(true);
  });
});

describe('a job that is interrupted', () => {
  it('by a store that is gone is done later, and leaves nothing', async () => {
    const id = await taken();
    await store.fault({ kind: 'gone' });
    expect(await drain()).toEqual({ done: 0, failed: 1 });
    expect((await rowOf(id)).state).toBe('waiting');
    const [job] = await select<{ last_error: string }>(
      "SELECT last_error FROM outbox WHERE kind = 'derive-photo' AND done_at IS NULL",
    );
    expect(job?.last_error).toBe('store-unavailable');
    await store.fault({ kind: 'none' });
    await run('UPDATE outbox SET due_at = NOW(3) WHERE done_at IS NULL');
    expect(await drain()).toEqual({ done: 1, failed: 0 });
    expect((await rowOf(id)).state).toBe('ready');
  });

  it('does not take an original for good whose bytes have changed in the store', async () => {
    const id = await taken();
    await run('UPDATE photos SET sha256 = ? WHERE id = ?', [Buffer.alloc(32, salt), id]);
    await expect(derivePhoto({ photoId: id })).rejects.toThrow('photo store does not answer');
    expect((await rowOf(id)).state).toBe('waiting');
  });

  it('between storing and writing down leaves objects that are swept, and is done anew', async () => {
    const id = await taken();
    await derivePhoto({ photoId: id });
    const orphaned = await copiesOf(id);
    await run('DELETE FROM photo_copies WHERE photo_id = ?', [id]);
    await run("UPDATE photos SET state = 'waiting' WHERE id = ?", [id]);
    await derivePhoto({ photoId: id });
    expect(await copiesOf(id)).toHaveLength(3);
    expect(await sweepObjects({ now: LATER })).toBe(3);
    for (const { object_key } of orphaned) expect(await getStream(object_key)).toBeUndefined();
    for (const { object_key } of await copiesOf(id))
      expect(await getStream(object_key)).toBeDefined();
  });
});
