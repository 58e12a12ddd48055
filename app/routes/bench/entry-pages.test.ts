import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { refusalOf, routeArgs } from '#tests/cases/route-args.ts';
import { addPhoto } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import * as addPage from './add.tsx';
import * as entryPage from './entry.tsx';

useDatabase();

let shop: TestShop;
let repair: TestCase;
let first: string;

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  repair = await takeInCase(shop);
  first = await add({ 'draft.title': 'Taken in' });
});

const words = { phase: 'during', visibility: 'shared' };
const addArgs = (form?: Record<string, string | string[]>, query = '', viewer = shop.technician) =>
  routeArgs(viewer, `/bench/cases/${repair.number}/add${query}`, { number: repair.number }, form);
const entryArgs = (
  entry: string,
  form?: Record<string, string | string[]>,
  viewer = shop.technician,
) =>
  routeArgs(
    viewer,
    `/bench/cases/${repair.number}/entries/${entry}`,
    { number: repair.number, entry },
    form && { ...words, ...form },
  );
const location = (answer: unknown) => (answer as Response).headers.get('Location') ?? '';
const read = async (id: string) =>
  (await listTimeline(shop.owner, { caseNumber: repair.number })).find((entry) => entry.id === id);

async function add(form: Record<string, string | string[]>): Promise<string> {
  const entryId = v7();
  await addPage.action(addArgs({ ...words, entryId, ...form }));
  return entryId;
}

describe('adding to the timeline', () => {
  it('gives the entry its id in the address, so that photos can go up under it', async () => {
    const redirected = await addPage.loader(addArgs()).catch((thrown: unknown) => thrown);
    expect(location(redirected)).toMatch(
      new RegExp(`^/bench/cases/${repair.number}/add\\?entry=[0-9a-f-]{36}$`),
    );
    const entryId = v7();
    expect(await addPage.loader(addArgs(undefined, `?entry=${entryId}`))).toMatchObject({
      entryId,
      phase: 'during',
      deskOnly: false,
      loose: [],
    });
  });

  it('reads the form: materials by line, a rest, photos up and coming', async () => {
    const n = await addPhoto(repair, first, shop.technician);
    const up = (await read(first))?.photos[0]?.id ?? '';
    const coming = v7();
    const entryId = v7();
    const answer = await addPage.action(
      addArgs({
        ...words,
        entryId,
        'draft.title': 'Bridge reglued',
        used: 'Hot hide glue\r\nCork',
        'draft.temperature': '21,5',
        'draft.rest.product': 'Hot hide glue',
        'draft.rest.clampsOffHours': '24',
        'photos.0.photoId': up,
        'photos.0.caption': 'Clamps on',
        'photos.1.photoId': coming,
        'photos.1.caption': 'From behind',
        'photos.1.bench': 'on',
      }),
    );
    expect(location(answer)).toBe(
      `/bench/cases/${repair.number}?added=${entryId}#entry-${entryId}`,
    );
    expect(await read(entryId)).toMatchObject({
      used: ['Hot hide glue', 'Cork'],
      temperature: '21.5',
      rest: { product: 'Hot hide glue', workedAt: null },
      photos: [{ n, caption: 'Clamps on', visibility: 'shared' }],
      expected: [{ id: coming, caption: 'From behind' }],
    });
    await entryPage.action(entryArgs(entryId, { 'draft.title': 'X', takeOff: [up, coming] }));
    expect(await read(entryId)).toMatchObject({ photos: [], expected: [], rest: null, used: [] });
    await entryPage.action(entryArgs(first, { 'draft.title': 'Taken in', takeOff: up }));
    const again = await addPage.loader(addArgs(undefined, `?entry=${v7()}`));
    expect(again.loose).toMatchObject([
      { id: up, name: `Photo ${n}`, leaveOut: 'Not on this entry' },
    ]);
    expect((await addPage.loader(addArgs(undefined, `?entry=${v7()}`, shop.desk))).loose).toEqual(
      [],
    );
  });

  it('comes back with what was typed when something is wrong', async () => {
    const typed = { 'draft.title': '', 'draft.text': 'Long note', 'draft.humidity': '500' };
    expect(await addPage.action(addArgs({ ...words, ...typed }))).toMatchObject({
      data: {
        fields: {
          'draft.title': expect.any(String) as string,
          'draft.humidity': expect.any(String) as string,
        },
        values: typed,
      },
      init: { status: 400 },
    });
  });

  it('is a 404 for an unknown case', async () => {
    const path = '/bench/cases/2026-999/add';
    const args = routeArgs(shop.technician, `${path}?entry=${v7()}`, { number: '2026-999' });
    expect((await refusalOf(addPage.loader(args))).status).toBe(404);
    const post = routeArgs(
      shop.technician,
      path,
      { number: '2026-999' },
      { ...words, 'draft.title': 'X' },
    );
    expect((await refusalOf(addPage.action(post))).status).toBe(404);
  });
});

describe('a draft', () => {
  it('is filled in as it was kept, and kept again as it was changed', async () => {
    const id = await add({
      'draft.title': 'Splines in',
      'draft.occurredClock': '2026-04-14T16:10',
      'draft.rest.product': 'Wood glue, aliphatic',
      'draft.rest.clampsOffHours': '2',
      'draft.rest.stringsHours': '48',
      'draft.minutes': '30',
    });
    const { values, maySeal, missing } = await entryPage.loader(entryArgs(id));
    expect(values).toMatchObject({
      'draft.title': 'Splines in',
      'draft.occurredClock': '2026-04-14T16:10',
      'draft.rest.clampsOffHours': '2',
      'draft.rest.workedHours': '',
      'draft.rest.stringsHours': '48',
      'draft.minutes': '30',
    });
    expect([maySeal, missing]).toEqual([true, 0]);
    const answer = await entryPage.action(
      entryArgs(id, { ...values, 'draft.text': 'A push fit.' }),
    );
    expect(location(answer)).toBe(`/bench/cases/${repair.number}#entry-${id}`);
    expect(await read(id)).toMatchObject({ text: 'A push fit.', minutes: 30 });
  });

  it('is sealed once asked, and then no longer changed', async () => {
    const id = await add({ 'draft.title': 'Frets levelled' });
    const asked = await entryPage.action(
      entryArgs(id, { intent: 'save-and-seal', 'draft.title': 'Frets levelled' }),
    );
    expect(location(asked)).toBe(`/bench/cases/${repair.number}/entries/${id}?ask=seal`);
    const sealed = await entryPage.action(entryArgs(id, { intent: 'seal' }));
    expect(location(sealed)).toBe(`/bench/cases/${repair.number}?sealed#entry-${id}`);
    expect((await read(id))?.seal).not.toBeNull();
    expect((await refusalOf(entryPage.loader(entryArgs(id)))).status).toBe(409);
    const late = entryPage.action(entryArgs(id, { 'draft.title': 'Other' }));
    expect((await refusalOf(late)).status).toBe(409);
  });

  it('is removed, but not the first', async () => {
    const id = await add({ 'draft.title': 'A mistake' });
    await entryPage.action(entryArgs(id, { intent: 'remove' }));
    expect(await read(id)).toBeUndefined();
    expect((await refusalOf(entryPage.action(entryArgs(first, { intent: 'remove' })))).status).toBe(
      409,
    );
  });

  it('of another case, or none, is a 404; of somebody else not the desk’s to seal', async () => {
    const { number } = await takeInCase(shop);
    const id = await add({ 'draft.title': 'Here' });
    const elsewhere = routeArgs(shop.technician, '/x', { number, entry: id });
    expect((await refusalOf(entryPage.loader(elsewhere))).status).toBe(404);
    expect((await refusalOf(entryPage.loader(entryArgs('none')))).status).toBe(404);
    expect(await entryPage.loader(entryArgs(id, undefined, shop.desk))).toMatchObject({
      maySeal: false,
    });
    const seal = entryPage.action(entryArgs(id, { intent: 'seal' }, shop.desk));
    expect((await refusalOf(seal)).status).toBe(403);
  });
});
