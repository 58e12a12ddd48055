import { beforeAll, describe, expect, it } from 'vitest';
import { v7 } from 'uuid';
import type { Invalid } from '#domain/errors.ts';
import { run, select } from '#server/db/sql.ts';
import { addPhoto, writeDraft } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { attachPhoto } from './attach-photo.ts';
import { detachPhoto } from './detach-photo.ts';
import { setPins } from './set-pins.ts';

useDatabase();

let shop: TestShop;
let repair: TestCase;
let photoId: string;
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
  const entryId = await writeDraft(repair, shop.technician);
  await addPhoto(repair, entryId, shop.technician);
  const [row] = await select<{ id: string }>('SELECT id FROM photos WHERE case_id = ?', [
    repair.id,
  ]);
  photoId = row?.id ?? '';
});

const here = (entryId: string) => ({ caseNumber: repair.number, entryId, photoId });
const links = (entryId: string) =>
  select('SELECT visibility, caption FROM entry_photos WHERE entry_id = ?', [entryId]);
const pinsOf = (entryId: string) =>
  select(
    `SELECT p.number, p.x, p.y, p.kind, p.label, p.note FROM pins p
     JOIN entry_photos l ON l.id = p.entry_photo_id WHERE l.entry_id = ? ORDER BY p.number`,
    [entryId],
  );
const SCRIPT = '<script>alert(1)</script>';

describe('putting a photo on a draft', () => {
  it('links it, and again changes what is given and nothing else', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    await attachPhoto(shop.technician, { ...here(entryId), caption: '  The crack\u0007 ' });
    expect(await links(entryId)).toEqual([{ visibility: 'shared', caption: 'The crack' }]);
    await attachPhoto(shop.technician, { ...here(entryId), visibility: 'bench' });
    expect(await links(entryId)).toEqual([{ visibility: 'bench', caption: 'The crack' }]);
    await attachPhoto(shop.owner, { ...here(entryId), caption: SCRIPT });
    expect(await links(entryId)).toEqual([{ visibility: 'bench', caption: SCRIPT }]);
  });

  it('refuses a caption that is too long, naming its field', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    const attaching = attachPhoto(shop.technician, { ...here(entryId), caption: 'x'.repeat(401) });
    await expect(attaching).rejects.toMatchObject({
      fields: { caption: 'The caption has 401 characters; 400 is the most. Shorten it.' },
    } satisfies Partial<Invalid>);
    expect(await links(entryId)).toEqual([]);
  });

  it('refuses a photo of another case, an unknown entry, a sealed one, another’s draft', async () => {
    const other = await takeInCase(shop);
    const foreign = await writeDraft(other, shop.technician);
    const own = await writeDraft(repair, shop.technician);
    await expect(
      attachPhoto(shop.technician, { ...here(foreign), caseNumber: other.number }),
    ).rejects.toThrow('No such photo is on this case.');
    await expect(attachPhoto(shop.technician, here(foreign))).rejects.toThrow('No such entry');
    await expect(attachPhoto(shop.technician, here(v7()))).rejects.toThrow('No such entry');
    await expect(attachPhoto(shop.desk, here(own))).rejects.toThrow('Somebody else wrote');
  });
});

describe('taking a photo off a draft', () => {
  it('takes its pins along and leaves the photo in the case', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    await attachPhoto(shop.technician, here(entryId));
    await setPins(shop.technician, {
      ...here(entryId),
      pins: [{ x: 1, y: 2, kind: 'damage', label: 'Crack' }],
    });
    await detachPhoto(shop.technician, here(entryId));
    expect([...(await links(entryId)), ...(await pinsOf(entryId))]).toEqual([]);
    expect(await select('SELECT id FROM photos WHERE id = ?', [photoId])).toHaveLength(1);
    await expect(detachPhoto(shop.technician, here(entryId))).rejects.toThrow('No such photo');
  });
});

describe('pins', () => {
  it('are set all together, numbered in order, in ten-thousandths', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    await attachPhoto(shop.technician, here(entryId));
    const set = (pins: Parameters<typeof setPins>[1]['pins']) =>
      setPins(shop.technician, { ...here(entryId), pins });
    await set([
      { x: 55.55, y: '12.3', kind: 'damage', label: 'Back edge lifted.', note: SCRIPT },
      { x: 100, y: 0, kind: 'remark', label: 'Slip of paper' },
    ]);
    expect(await pinsOf(entryId)).toEqual([
      { number: 1, x: 5555, y: 1230, kind: 'damage', label: 'Back edge lifted.', note: SCRIPT },
      { number: 2, x: 10000, y: 0, kind: 'remark', label: 'Slip of paper', note: '' },
    ]);
    await set([]);
    expect(await pinsOf(entryId)).toEqual([]);
  });

  it('are refused with a sentence per field, and nothing changes', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    await attachPhoto(shop.technician, here(entryId));
    const setting = setPins(shop.technician, {
      ...here(entryId),
      pins: [{ x: 101, y: -1, kind: 'damage', label: ' ' }],
    });
    await expect(setting).rejects.toMatchObject({
      fields: {
        'pins.0.x': 'This pin is outside the photo. Set it again.',
        'pins.0.y': 'This pin is outside the photo. Set it again.',
        'pins.0.label': 'The pin has no title. Write what is there.',
      },
    });
  });

  it('belong to a photo that is on the draft', async () => {
    const entryId = await writeDraft(repair, shop.technician);
    await expect(setPins(shop.technician, { ...here(entryId), pins: [] })).rejects.toThrow(
      'No such photo is on this entry.',
    );
  });
});

it('a sealed entry keeps its photos', async () => {
  const entryId = await writeDraft(repair, shop.technician);
  await attachPhoto(shop.technician, here(entryId));
  const bytes = Buffer.alloc(65, 9);
  await run('INSERT INTO log_leaves (leaf_index, entry) VALUES (9, ?)', [bytes]);
  await run(
    `INSERT INTO sealed_entries (leaf_index, chain, seq, kind, header, header_salt, commitment, recorded_at)
     VALUES (9, ?, 1, 'entry', '', ?, ?, NOW(3))`,
    [repair.record, bytes.subarray(0, 32), bytes.subarray(0, 32)],
  );
  await run('UPDATE entries SET draft = NULL, leaf_index = 9 WHERE id = ?', [entryId]);
  const sealed = 'This entry is sealed.';
  await expect(attachPhoto(shop.technician, here(entryId))).rejects.toThrow(sealed);
  await expect(detachPhoto(shop.technician, here(entryId))).rejects.toThrow(sealed);
  await expect(setPins(shop.technician, { ...here(entryId), pins: [] })).rejects.toThrow(sealed);
  expect(await links(entryId)).toHaveLength(1);
});
