import { randomBytes } from 'node:crypto';
import { afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '#domain/errors.ts';
import { select } from '#server/db/sql.ts';
import { heicShell } from '#tests/photos/heic.ts';
import { aJpeg, aPng, pngHeader } from '#tests/photos/pictures.ts';
import { inPieces, sent, whatIsKept } from '#tests/photos/sending.ts';
import { ownStore } from '#tests/record/own-store.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import type { PhotoToPut } from './photo-to-put.ts';
import { putPhoto } from './put-photo.ts';
import { sweepObjects } from './sweep-objects.ts';

const store = await ownStore();
useDatabase();

let shop: TestShop;
let repair: TestCase;
let before: Record<string, number>;
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
  before = await whatIsKept();
});

afterEach(async () => {
  await store.fault({ kind: 'none' });
  expect(await whatIsKept()).toEqual(before);
});

const refused = (
  file: Uint8Array,
  change: Partial<PhotoToPut> = {},
  source: AsyncIterable<Uint8Array> = inPieces(file),
  options = {},
) =>
  putPhoto(shop.technician, sent(repair.number, file, change), source, options).then(
    () => expect.unreachable('it was taken in'),
    (error: Problem) => ({ code: error.code, sentence: error.message }),
  );

const manyBytes = (file: Uint8Array) => Buffer.concat([file, randomBytes(300_000)]);

describe('what is refused with a sentence and leaves nothing behind', () => {
  it('an empty file', async () => {
    expect(await refused(Buffer.alloc(0))).toEqual({
      code: 'invalid',
      sentence: 'This file is empty. Choose the photo again.',
    });
  });

  it('words in a file that is named .jpg', async () => {
    const words = Buffer.from('Dear shop, the bridge is lifting again.');
    expect(await refused(words, { fileName: 'bridge.jpg' })).toEqual({
      code: 'unsupported',
      sentence: 'This file is not a photo the shop can read. Send JPEG, PNG, WebP or HEIC.',
    });
  });

  it('a truncated JPEG, PNG or HEIC', async () => {
    for (const [mediaType, file] of [
      ['image/jpeg', await aJpeg()],
      ['image/png', await aPng()],
      ['image/heic', heicShell()],
    ] as const) {
      const cut = file.subarray(0, Math.floor(file.length * 0.7));
      expect(await refused(cut, { mediaType }), mediaType).toEqual({
        code: 'invalid',
        sentence:
          'This photo stops before its end. Copy it again from the camera, or take it again.',
      });
    }
  });

  it('the head of a picture of 200 million pixels', async () => {
    expect(await refused(pngHeader(20_000, 10_000), { mediaType: 'image/png' })).toEqual({
      code: 'too-large',
      sentence:
        'This picture has 200 million pixels and the shop takes 65. Make it smaller and send it again.',
    });
  });

  it('a picture whose size is only known in the middle, when much of it is in the store', async () => {
    const file = await aJpeg();
    const frame = file.indexOf(Buffer.from([0xff, 0xc0]));
    const large = Buffer.from(file);
    large.writeUInt16BE(20_000, frame + 5);
    large.writeUInt16BE(10_000, frame + 7);
    const padding = Buffer.concat(
      Array(20).fill(Buffer.from([0xff, 0xfe, 0xff, 0xff, ...Buffer.alloc(65_533)])),
    );
    const late = Buffer.concat([large.subarray(0, 2), padding, large.subarray(2)]);
    expect((await refused(late)).code).toBe('too-large');
  });

  it('a file of 60 MB, before a byte of it is read', async () => {
    const never = {
      [Symbol.asyncIterator]: () => ({ next: () => expect.unreachable('it was read') }),
    };
    expect(await refused(await aJpeg(), { length: 60_000_000 }, never)).toEqual({
      code: 'too-large',
      sentence:
        'This file has 60 MB and the shop takes 50. Make the photo smaller and send it again.',
    });
  });

  it('another type than it is sent as', async () => {
    expect(await refused(await aPng(), { mediaType: 'image/jpeg' })).toEqual({
      code: 'unsupported',
      sentence: 'This file was sent as image/jpeg and is image/png. Send it as what it is.',
    });
    expect((await refused(await aJpeg(), { mediaType: 'text/html' })).code).toBe('unsupported');
  });

  it('a damaged PNG', async () => {
    const png = await aPng();
    png[png.length - 20] = (png[png.length - 20] ?? 0) ^ 1;
    expect(await refused(png, { mediaType: 'image/png' })).toMatchObject({
      sentence: 'This photo is damaged inside. Copy it again from the camera, or take it again.',
    });
  });

  it('other bytes than were hashed', async () => {
    const file = manyBytes(await aJpeg());
    const changed = Buffer.from(file);
    changed[changed.length - 9] = (changed[changed.length - 9] ?? 0) ^ 1;
    expect(await refused(file, {}, inPieces(changed))).toEqual({
      code: 'arrived-damaged',
      sentence: 'The photo did not arrive as it was sent. Send it again.',
    });
  });

  it('fewer or more bytes than were said', async () => {
    const file = manyBytes(await aJpeg());
    const damaged = { code: 'arrived-damaged' };
    expect(await refused(file, {}, inPieces(file.subarray(0, 200_000)))).toMatchObject(damaged);
    expect(await refused(file, { length: file.length - 1 })).toMatchObject(damaged);
    expect(await refused(file, { length: file.length + 1 })).toMatchObject(damaged);
  });

  it('a photo without hash, length or id', async () => {
    const file = await aJpeg();
    for (const change of [
      { sha256: 'no hash' },
      { length: Number.NaN },
      { photoId: '../../etc' },
      { entryId: "1' OR 1=1" },
    ])
      expect(await refused(file, change)).toMatchObject({ code: 'invalid' });
  });

  it('a photo for a case that is not there', async () => {
    const file = await aJpeg();
    for (const caseNumber of ['2026-999', '2026-31', 'x', '2026-001 OR 1=1'])
      expect(await refused(file, { caseNumber })).toMatchObject({ code: 'not-found' });
  });
});

describe('what breaks off and leaves nothing behind', () => {
  it('a sender that goes away in the middle', async () => {
    const file = manyBytes(await aJpeg());
    async function* leaving() {
      yield* inPieces(file.subarray(0, 250_000));
      throw new Error('ECONNRESET');
    }
    expect(await refused(file, {}, leaving())).toEqual({
      code: 'arrived-damaged',
      sentence: 'The photo stopped coming half-way. Send it again.',
    });
  });

  it('a session that ends while the photo goes up', async () => {
    const file = manyBytes(await aJpeg());
    const stillAllowed = () => Promise.reject(new Error('signed out'));
    expect(await refused(file, {}, inPieces(file), { stillAllowed })).toMatchObject({
      sentence: 'signed out',
    });
  });

  it.each(['refuse', 'gone'] as const)('a store that does %s', async (kind) => {
    await store.fault({ kind });
    expect(await refused(manyBytes(await aJpeg()))).toEqual({
      code: 'store-unavailable',
      sentence: 'The shop’s photo store does not answer. Wait a minute and try again.',
    });
    await store.fault({ kind: 'none' });
  });

  it('a store that goes away in the middle, once it is swept', async () => {
    const file = manyBytes(await aJpeg());
    async function* whileTheStoreGoes() {
      for await (const piece of inPieces(file)) {
        yield piece;
        await store.fault({ kind: 'gone' });
      }
    }
    const { code } = await refused(file, {}, whileTheStoreGoes());
    expect(code).toBe('store-unavailable');
    await store.fault({ kind: 'none' });
    const left = await whatIsKept();
    expect({ ...left, objects: before.objects }).toEqual(before);
    expect(await sweepObjects()).toBe(0);
    const later = new Date(Date.now() + 2 * 60 * 60 * 1000);
    expect(await sweepObjects({ now: later })).toBe((left.objects ?? 0) - (before.objects ?? 0));
  });
});

describe('a store that is slow', () => {
  it('takes the photo all the same', async () => {
    const other = await takeInCase(shop);
    const file = await aJpeg({ salt: 7 });
    await store.fault({ kind: 'slow', ms: 300 });
    const { photo } = await putPhoto(shop.technician, sent(other.number, file), inPieces(file));
    const rows = await select('SELECT id FROM photos WHERE id = ?', [photo.id]);
    expect(rows).toHaveLength(1);
    await store.fault({ kind: 'none' });
    before = await whatIsKept();
  });
});
