import { beforeAll, describe, expect, it } from 'vitest';
import type { CustomerViewer } from '#domain/viewer.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { amendEntry } from '#server/record/amend-entry.ts';
import { closeCase } from '#server/record/close-case.ts';
import { sealEntry } from '#server/record/seal-entry.ts';
import { addPhoto } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { addEntry } from './add-entry.ts';
import { editEntry } from './edit-entry.ts';
import { listTimeline } from './list-timeline.ts';
import { removeDraft } from './remove-draft.ts';

useDatabase();

let shop: TestShop;
let repair: TestCase;
let owner: CustomerViewer;
let shared: string;
let bench: string;
const now = new Date('2026-04-15T08:40:00.000Z');

const add = async (visibility: 'shared' | 'bench', draft: object) => {
  const input = { caseNumber: repair.number, phase: 'during', visibility, draft };
  return (await addEntry(shop.technician, input, { now })).entryId;
};
const seal = (entryId: string) =>
  sealEntry(shop.technician, { caseNumber: repair.number, entryId }, { now });
const seen = (viewer: TestShop['desk'] | CustomerViewer) =>
  listTimeline(viewer, { caseNumber: repair.number });

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  repair = await takeInCase(shop);
  owner = { kind: 'customer', customerId: repair.ownerId, name: 'Leopoldine Carrow' };
  shared = await add('shared', {
    title: 'Crack glued and cleated',
    text: 'Three cleats inside.',
    benchNote: 'Took too long.',
    used: ['Hot hide glue'],
    temperature: '21',
    humidity: '48',
    minutes: 50,
    rest: { product: 'Hot hide glue', clampsOffHours: '24', workedHours: null, stringsHours: null },
  });
  await addPhoto(repair, shared, shop.technician, { caption: 'Inside, back off' });
  await addPhoto(repair, shared, shop.technician, {
    caption: 'The untidy bench',
    visibility: 'bench',
  });
  bench = await add('bench', { title: 'Old glue left on', text: 'Clean next time.' });
  await addPhoto(repair, bench, shop.technician, { caption: 'Old glue' });
});

const WORDS = {
  title: 'Crack glued and cleated',
  text: 'Three cleats inside.',
  used: ['Hot hide glue'],
  temperature: '21',
  humidity: '48',
};

describe('a timeline', () => {
  it('shows drafts to the bench, and nothing of them to the owner', async () => {
    expect(await seen(shop.desk)).toMatchObject([
      { id: shared, ...WORDS, seal: null },
      { id: bench, title: 'Old glue left on', visibility: 'bench' },
    ]);
    expect(await seen(owner)).toEqual([]);
  });

  it('once sealed reads the same words out of the record', async () => {
    const { leafHash } = await seal(shared);
    await seal(bench);
    const [first, second] = await seen(shop.desk);
    expect(first).toMatchObject({
      ...WORDS,
      benchNote: 'Took too long.',
      minutes: 50,
      writtenBy: 'Bram Ottway',
      rest: { product: 'Hot hide glue', startedAt: now },
      photos: [
        { n: 1, caption: 'Inside, back off', visibility: 'shared' },
        { n: 2, caption: 'The untidy bench', visibility: 'bench' },
      ],
      seal: { at: now, by: 'Bram Ottway', leafHash },
    });
    expect(second).toMatchObject({
      title: 'Old glue left on',
      text: 'Clean next time.',
      photos: [{ caption: 'Old glue' }],
    });
  });

  it('gives the owner what is sealed and shared, and not a word more', async () => {
    const list = await seen(owner);
    expect(list).toMatchObject([
      {
        ...WORDS,
        benchNote: '',
        minutes: null,
        writtenBy: null,
        writtenById: null,
        photos: [{ n: 1, caption: 'Inside, back off' }],
        seal: { by: 'Bram Ottway' },
      },
    ]);
    const text = JSON.stringify(list);
    for (const secret of ['too long', 'untidy', 'Old glue', 'next time'])
      expect(text).not.toContain(secret);
  });

  it('refuses to change or remove what is sealed', async () => {
    const edit = {
      caseNumber: repair.number,
      entryId: shared,
      phase: 'during',
      visibility: 'shared',
    };
    await expect(
      editEntry(shop.owner, { ...edit, draft: { title: 'Other' } }),
    ).rejects.toMatchObject({
      code: 'conflict',
    });
    await expect(
      removeDraft(shop.owner, { caseNumber: repair.number, entryId: bench }),
    ).rejects.toMatchObject({ code: 'conflict' });
  });

  it('shows a correction beside what it corrects, and the close', async () => {
    const { entryId } = await amendEntry(
      shop.technician,
      { caseNumber: repair.number, entryId: shared },
      { now },
    );
    const input = { caseNumber: repair.number, entryId, phase: 'during', visibility: 'shared' };
    await editEntry(
      shop.technician,
      { ...input, draft: { title: 'Four cleats, not three' } },
      { now },
    );
    await seal(entryId);
    await closeCase(shop.owner, { caseNumber: repair.number }, { now });
    expect((await seen(owner)).map(({ title, kind }) => [kind, title])).toEqual([
      ['entry', 'Crack glued and cleated'],
      ['amendment', 'Four cleats, not three'],
      ['close', 'Case closed'],
    ]);
    const correction = (await seen(owner)).find(({ kind }) => kind === 'amendment');
    expect(correction?.corrects).toEqual({ id: shared, title: 'Crack glued and cleated' });
  });
});
