import { buffer } from 'node:stream/consumers';
import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { EntryDraftSchema } from '#domain/entry-draft.ts';
import { PUBLIC } from '#domain/viewer.ts';
import { run, select } from '#server/db/sql.ts';
import { getStream } from '#server/storage/objects.ts';
import { aJpeg, aPng } from '#tests/photos/pictures.ts';
import { inPieces, sent, sha256Of, whatIsKept } from '#tests/photos/sending.ts';
import { writeDraft } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { useStore } from '#tests/setup/store.ts';
import { putPhoto } from './put-photo.ts';

useDatabase();
useStore();

let shop: TestShop;
let repair: TestCase;
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
});

let salt = 0;
/** A photo that no other test has sent. */
const newJpeg = () => aJpeg({ salt: (salt += 1) });

const put = (file: Uint8Array, change = {}, viewer = shop.technician) =>
  putPhoto(viewer, sent(repair.number, file, change), inPieces(file));

const rowOf = async (id: string) => {
  const [row] = await select<Record<string, unknown>>('SELECT * FROM photos WHERE id = ?', [id]);
  return row;
};
const linksOf = (entryId: string) =>
  select<Record<string, unknown>>(
    'SELECT photo_id, visibility, caption FROM entry_photos WHERE entry_id = ?',
    [entryId],
  );

describe('a photo that is taken in', () => {
  it('is kept byte for byte, with its row, its number and its job', async () => {
    const file = await newJpeg();
    const now = new Date('2026-04-15T08:40:00.123Z');
    const input = sent(repair.number, file, { fileName: '../IMG \u202e0001\n.jpg' });
    const made = await putPhoto(shop.technician, input, inPieces(file), { now });
    expect(made).toEqual({
      photo: { id: input.photoId, number: 1, sha256: sha256Of(file) },
      isNew: true,
      linked: null,
    });
    const row = await rowOf(input.photoId);
    expect(row).toMatchObject({
      case_id: repair.id,
      bytes: String(file.length),
      media_type: 'image/jpeg',
      file_name: '..IMG 0001.jpg',
      uploaded_by: shop.technician.personId,
      received_at: now,
      state: 'waiting',
      width: 96,
      height: 64,
      taken_clock: null,
    });
    const stored = await getStream(String(row?.object_key));
    expect(stored && sha256Of(await buffer(stored))).toBe(sha256Of(file));
    const [job] = await select<{ payload: string }>(
      "SELECT payload FROM outbox WHERE kind = 'derive-photo' AND case_id = ?",
      [repair.id],
    );
    expect(JSON.parse(job?.payload ?? '')).toEqual({ photoId: input.photoId });
  });

  it('counts on within its case', async () => {
    const other = await takeInCase(shop);
    const [first, second] = [await newJpeg(), await newJpeg()];
    const made = [
      await putPhoto(shop.desk, sent(other.number, first), inPieces(first)),
      await putPhoto(shop.owner, sent(other.number, second), inPieces(second)),
    ];
    expect(made.map(({ photo }) => photo.number)).toEqual([1, 2]);
  });

  it('may come in pieces of one byte', async () => {
    const file = await newJpeg();
    const input = sent(repair.number, file);
    await putPhoto(shop.technician, input, inPieces(file, 1));
    const stored = await getStream(String((await rowOf(input.photoId))?.object_key));
    expect(stored && (await buffer(stored)).equals(file)).toBe(true);
  });

  it('may be sent without a type', async () => {
    const file = await aPng();
    const { photo } = await put(file, { mediaType: null, fileName: null });
    expect(await rowOf(photo.id)).toMatchObject({ media_type: 'image/png', file_name: null });
  });
});

describe('the same photo twice', () => {
  it('is one photo, under the same id or another', async () => {
    const file = await newJpeg();
    const photoId = v7();
    const first = await put(file, { photoId });
    const before = await whatIsKept();
    expect(await put(file, { photoId })).toEqual({ ...first, isNew: false });
    expect(await put(file)).toEqual({ ...first, isNew: false });
    expect(await whatIsKept()).toEqual(before);
  });

  it('is one photo when it comes several times at once', async () => {
    const file = await newJpeg();
    const before = await whatIsKept();
    const made = await Promise.all(Array.from({ length: 5 }, () => put(file)));
    expect(new Set(made.map(({ photo }) => photo.id)).size).toBe(1);
    expect(made.filter(({ isNew }) => isNew)).toHaveLength(1);
    const after = await whatIsKept();
    for (const kind of ['photos', 'jobs', 'numbers', 'objects'])
      expect((after[kind] ?? 0) - (before[kind] ?? 0), kind).toBe(1);
  });

  it('is two photos in two cases', async () => {
    const other = await takeInCase(shop);
    const file = await newJpeg();
    const first = await put(file);
    const second = await putPhoto(shop.technician, sent(other.number, file), inPieces(file));
    expect(second.isNew).toBe(true);
    expect(second.photo.id).not.toBe(first.photo.id);
  });

  it('is not mixed up with another file under the same id', async () => {
    const photoId = v7();
    await put(await newJpeg(), { photoId });
    const other = await takeInCase(shop);
    const file = await newJpeg();
    const before = await whatIsKept();
    const sentence = 'Another photo was sent under this address. Choose the photo again.';
    await expect(put(file, { photoId })).rejects.toThrow(sentence);
    const elsewhere = sent(other.number, file, { photoId });
    await expect(putPhoto(shop.technician, elsewhere, inPieces(file))).rejects.toThrow(sentence);
    expect(await whatIsKept()).toEqual(before);
  });
});

describe('a photo for a draft', () => {
  it('is linked to it as the draft says', async () => {
    const entryId = await writeDraft(repair, shop.technician, { visibility: 'shared' });
    const plain = await put(await newJpeg(), { entryId });
    expect(plain.linked).toBe(true);
    const photoId = v7();
    const expected = [{ photoId, caption: 'Bridge off', visibility: 'bench' as const }];
    const draft = EntryDraftSchema.parse({ title: 'Bridge', text: '', expected });
    await run('UPDATE entries SET draft = ? WHERE id = ?', [JSON.stringify(draft), entryId]);
    await put(await newJpeg(), { entryId, photoId });
    expect(await linksOf(entryId)).toEqual([
      { photo_id: plain.photo.id, visibility: 'shared', caption: null },
      { photo_id: photoId, visibility: 'bench', caption: 'Bridge off' },
    ]);
  });

  it('is for the bench alone in an entry that is', async () => {
    const entryId = await writeDraft(repair, shop.technician, { visibility: 'bench' });
    await put(await newJpeg(), { entryId });
    expect(await linksOf(entryId)).toMatchObject([{ visibility: 'bench' }]);
  });

  it('takes the place of the one the draft expects when the same file was there', async () => {
    const file = await newJpeg();
    const { photo } = await put(file);
    const entryId = await writeDraft(repair, shop.technician);
    const awaited = v7();
    const expected = [{ photoId: awaited, caption: 'The crack', visibility: 'shared' as const }];
    const draft = EntryDraftSchema.parse({ title: 'Bridge', text: '', expected });
    await run('UPDATE entries SET draft = ? WHERE id = ?', [JSON.stringify(draft), entryId]);
    await put(file, { entryId, photoId: awaited });
    expect(await linksOf(entryId)).toMatchObject([{ photo_id: photo.id, caption: 'The crack' }]);
    const [row] = await select<{ draft: string }>('SELECT draft FROM entries WHERE id = ?', [
      entryId,
    ]);
    expect(JSON.parse(row?.draft ?? '')).toMatchObject({ expected: [] });
  });

  it('is kept and said not to be linked when there is no such draft, or not for this person', async () => {
    const unknown = await put(await newJpeg(), { entryId: v7() });
    const elsewhere = await takeInCase(shop);
    const foreign = await writeDraft(elsewhere, shop.technician);
    const ofOtherCase = await put(await newJpeg(), { entryId: foreign });
    const entryId = await writeDraft(repair, shop.technician);
    const byDesk = await put(await newJpeg(), { entryId }, shop.desk);
    for (const made of [unknown, ofOtherCase, byDesk])
      expect(made).toMatchObject({ isNew: true, linked: false });
    expect([...(await linksOf(foreign)), ...(await linksOf(entryId))]).toEqual([]);
  });

  it('comes up for a correction of a closed case, and for nothing else of it', async () => {
    const closed = await takeInCase(shop);
    const entryId = await writeDraft(closed, shop.technician);
    await run('UPDATE cases SET closed_at = NOW(3) WHERE id = ?', [closed.id]);
    const [first, second] = [await newJpeg(), await newJpeg()];
    const linked = sent(closed.number, first, { entryId });
    expect((await putPhoto(shop.technician, linked, inPieces(first))).linked).toBe(true);
    const before = await whatIsKept();
    await expect(
      putPhoto(shop.technician, sent(closed.number, second), inPieces(second)),
    ).rejects.toThrow('The case is closed.');
    expect(await whatIsKept()).toEqual(before);
  });
});

describe('who may add photos', () => {
  it('is a person of the shop, and nobody else', async () => {
    const file = await newJpeg();
    const before = await whatIsKept();
    const customer = { kind: 'customer', customerId: repair.ownerId, name: 'Owner' } as const;
    for (const viewer of [PUBLIC, customer]) {
      const putting = putPhoto(viewer, sent(repair.number, file), inPieces(file));
      await expect(putting).rejects.toThrow('Your role does not include this.');
    }
    expect(await whatIsKept()).toEqual(before);
  });
});
