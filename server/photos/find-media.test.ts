import { beforeAll, describe, expect, it } from 'vitest';
import { v7 } from 'uuid';
import { PUBLIC, type CustomerViewer } from '#domain/viewer.ts';
import { run, select } from '#server/db/sql.ts';
import { addPhoto, writeDraft } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { findMedia } from './find-media.ts';
import { listCasePhotos } from './list-case-photos.ts';

useDatabase();

let shop: TestShop;
let repair: TestCase;
let owner: CustomerViewer;
let stranger: CustomerViewer;
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
  const other = await takeInCase(shop);
  owner = { kind: 'customer', customerId: repair.ownerId, name: 'Leopoldine Carrow' };
  stranger = { kind: 'customer', customerId: other.ownerId, name: 'Somebody Else' };
});

let leaf = 0;
/** Marks the entry as sealed, as far as what may be seen goes. */
async function seal(entryId: string): Promise<void> {
  const index = (leaf += 1);
  const bytes = Buffer.alloc(65, index);
  await run('INSERT INTO log_leaves (leaf_index, entry) VALUES (?, ?)', [index, bytes]);
  await run(
    `INSERT INTO sealed_entries (leaf_index, chain, seq, kind, header, header_salt, commitment, recorded_at)
     VALUES (?, ?, ?, 'entry', '', ?, ?, NOW(3))`,
    [index, repair.record, index, bytes.subarray(0, 32), bytes.subarray(0, 32)],
  );
  await run('UPDATE entries SET draft = NULL, leaf_index = ?, sealed_at = NOW(3) WHERE id = ?', [
    index,
    entryId,
  ]);
}

async function aPhoto(of: {
  entry: 'shared' | 'bench';
  photo: 'shared' | 'bench';
  sealed: boolean;
}): Promise<string> {
  const entryId = await writeDraft(repair, shop.technician, { visibility: of.entry });
  const n = await addPhoto(repair, entryId, shop.technician, { visibility: of.photo });
  if (of.sealed) await seal(entryId);
  const [row] = await select<{ id: string }>(
    'SELECT id FROM photos WHERE case_id = ? AND number = ?',
    [repair.id, n],
  );
  return row?.id ?? '';
}

const missing = 'There is no such photo. Open the case again.';

describe('a photo that is shared and sealed', () => {
  it('is given to the owner as a copy, never as the original', async () => {
    const photoId = await aPhoto({ entry: 'shared', photo: 'shared', sealed: true });
    expect(await findMedia(owner, { photoId, size: '2048' })).toMatchObject({
      mediaType: 'image/webp',
      bytes: 500,
      saveAs: null,
    });
    await expect(findMedia(owner, { photoId, size: 'original' })).rejects.toThrow(missing);
  });

  it('is not given to another customer or to anyone unknown', async () => {
    const photoId = await aPhoto({ entry: 'shared', photo: 'shared', sealed: true });
    await expect(findMedia(stranger, { photoId, size: '2048' })).rejects.toThrow(missing);
    await expect(findMedia(PUBLIC, { photoId, size: '2048' })).rejects.toThrow('Your role');
  });
});

describe('a photo the owner may not see', () => {
  it.each([
    ['of a bench-only entry', { entry: 'bench', photo: 'shared', sealed: true }],
    ['marked for the bench', { entry: 'shared', photo: 'bench', sealed: true }],
    ['not yet sealed', { entry: 'shared', photo: 'shared', sealed: false }],
  ] as const)('%s is not there for them, and is for the shop', async (_name, of) => {
    const photoId = await aPhoto(of);
    for (const size of ['2048', 'original'])
      await expect(findMedia(owner, { photoId, size })).rejects.toThrow(missing);
    expect((await findMedia(shop.desk, { photoId, size: '2048' })).bytes).toBe(500);
    const original = await findMedia(shop.technician, { photoId, size: 'original' });
    expect(original).toMatchObject({ mediaType: 'image/jpeg', bytes: 1000 });
    expect(original.saveAs).toMatch(/^2026-001-photo-\d+\.jpg$/);
  });

  it('is there for them once another entry shares it', async () => {
    const photoId = await aPhoto({ entry: 'bench', photo: 'shared', sealed: true });
    const shared = await writeDraft(repair, shop.technician);
    await run(
      "INSERT INTO entry_photos (id, entry_id, photo_id, visibility) VALUES (?, ?, ?, 'shared')",
      [v7(), shared, photoId],
    );
    await expect(findMedia(owner, { photoId, size: '2048' })).rejects.toThrow(missing);
    await seal(shared);
    expect((await findMedia(owner, { photoId, size: '2048' })).bytes).toBe(500);
  });
});

describe('what is no photo', () => {
  it('is not there for the shop either', async () => {
    const photoId = await aPhoto({ entry: 'shared', photo: 'shared', sealed: true });
    for (const wanted of [
      { photoId: v7(), size: '2048' },
      { photoId: 'x', size: '2048' },
      { photoId, size: '640' },
      { photoId, size: '960' },
      { photoId, size: '../2048' },
    ])
      await expect(findMedia(shop.owner, wanted)).rejects.toThrow(missing);
  });
});

describe('the photos of a case', () => {
  it('are all of them for the shop, and the shared and sealed ones for the owner', async () => {
    const all = await listCasePhotos(shop.technician, { caseNumber: repair.number });
    const seen = await listCasePhotos(owner, { caseNumber: repair.number });
    expect(all.length).toBeGreaterThan(seen.length);
    expect(all.every(({ sha256, addedBy }) => sha256?.length === 64 && addedBy)).toBe(true);
    expect(seen.length).toBeGreaterThan(0);
    for (const { sha256, addedBy, links } of seen) {
      expect([sha256, addedBy]).toEqual([null, null]);
      expect(links.length).toBeGreaterThan(0);
      expect(links.every(({ visibility, sealed }) => visibility === 'shared' && sealed)).toBe(true);
    }
    await expect(listCasePhotos(stranger, { caseNumber: repair.number })).rejects.toThrow(
      'No case has this number.',
    );
  });
});
