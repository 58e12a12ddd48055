import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Invalid } from '#domain/errors.ts';
import { getCase } from '#server/cases/get-case.ts';
import { run, select } from '#server/db/sql.ts';
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
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
  const cameIn = { title: 'Taken in at the counter' };
  const first = new Date('2026-03-01T10:00:00.000Z');
  await addEntry(shop.desk, entry({ draft: cameIn }), { now: first });
});

const now = new Date('2026-04-15T08:40:00.000Z');
const draft = { title: 'Bridge reglued', text: 'Dry run first.', benchNote: 'Hurry next time.' };
const rest = {
  product: 'Hot hide glue',
  clampsOffHours: '24',
  workedHours: '24',
  stringsHours: '48',
};
const entry = (change: object = {}) => ({
  caseNumber: repair.number,
  phase: 'during',
  visibility: 'shared',
  draft,
  photos: [],
  ...change,
});
const timeline = () => listTimeline(shop.technician, { caseNumber: repair.number });
const find = async (id: string) => (await timeline()).find((one) => one.id === id);

async function photoOnCase(): Promise<string> {
  const { entryId } = await addEntry(shop.technician, entry());
  const n = await addPhoto(repair, entryId, shop.technician);
  const [photo] = await select<{ id: string }>(
    'SELECT id FROM photos WHERE case_id = ? AND number = ?',
    [repair.id, n],
  );
  await run('DELETE FROM entry_photos WHERE entry_id = ?', [entryId]);
  await removeDraft(shop.technician, { caseNumber: repair.number, entryId });
  return photo?.id ?? '';
}

describe('adding an entry', () => {
  it('writes a draft with its rest, and the case rests', async () => {
    const { entryId } = await addEntry(
      shop.technician,
      entry({
        draft: { ...draft, rest, used: ['Hot hide glue'], temperature: '21', humidity: '48' },
      }),
      { now },
    );
    expect(await find(entryId)).toMatchObject({
      ...draft,
      phase: 'during',
      used: ['Hot hide glue'],
      temperature: '21',
      writtenBy: 'Bram Ottway',
      writtenAt: now,
      seal: null,
      rest: {
        product: 'Hot hide glue',
        startedAt: now,
        clampsOffAt: new Date('2026-04-16T08:40:00.000Z'),
        stringsAt: new Date('2026-04-17T08:40:00.000Z'),
      },
    });
    const soon = { now: new Date('2026-04-15T12:00:00.000Z') };
    const { state } = await getCase(shop.desk, { number: repair.number }, soon);
    expect(state).toMatchObject({ state: 'rest', next: { name: 'clamps off' } });
    await removeDraft(shop.technician, { caseNumber: repair.number, entryId });
    expect((await getCase(shop.desk, { number: repair.number }, soon)).state.state).toBe('bench');
  });

  it('is the same entry when the form is sent twice', async () => {
    const entryId = v7();
    await addEntry(shop.technician, entry({ entryId }));
    await addEntry(shop.technician, entry({ entryId, draft: { ...draft, title: 'Again' } }));
    expect(await find(entryId)).toMatchObject({ title: 'Bridge reglued' });
  });

  it('counts a change of the case each time', async () => {
    const version = async () =>
      Number((await getCase(shop.desk, { number: repair.number })).version);
    const before = await version();
    const { entryId } = await addEntry(shop.technician, entry());
    await editEntry(shop.technician, { ...entry(), entryId });
    await removeDraft(shop.technician, { caseNumber: repair.number, entryId });
    expect(await version()).toBe(before + 3);
  });

  it('keeps a script in a title or caption as the text it is', async () => {
    const photoId = await photoOnCase();
    const script = '<script>alert(1)</script>';
    const photos = [{ photoId, caption: script, visibility: 'shared' }];
    const { entryId } = await addEntry(
      shop.technician,
      entry({ draft: { ...draft, title: script }, photos }),
    );
    expect(await find(entryId)).toMatchObject({ title: script, photos: [{ caption: script }] });
  });

  it('remembers the photos that are not up yet, with their captions', async () => {
    const [up, later] = [await photoOnCase(), v7()];
    const photos = [
      { photoId: up, caption: 'Front', visibility: 'shared' },
      { photoId: later, caption: 'Back', visibility: 'bench' },
    ];
    const { entryId } = await addEntry(shop.technician, entry({ photos }));
    expect(await find(entryId)).toMatchObject({
      photos: [{ id: up, caption: 'Front' }],
      expected: [{ id: later, caption: 'Back' }],
    });
    await editEntry(shop.technician, { ...entry(), entryId, photos: [], takeOff: [later, up] });
    expect(await find(entryId)).toMatchObject({ photos: [], expected: [] });
  });

  it('takes no photo of another case', async () => {
    const foreign = await photoOnCase();
    const other = await takeInCase(shop);
    const photos = [{ photoId: foreign, caption: null, visibility: 'shared' }];
    const { entryId } = await addEntry(shop.technician, {
      ...entry({ photos }),
      caseNumber: other.number,
    });
    const [row] = await listTimeline(shop.technician, { caseNumber: other.number });
    expect(row).toMatchObject({ id: entryId, photos: [] });
  });

  it('makes every photo of a bench entry a bench photo', async () => {
    const photos = [{ photoId: await photoOnCase(), caption: null, visibility: 'shared' }];
    const { entryId } = await addEntry(shop.technician, entry({ visibility: 'bench', photos }));
    expect((await find(entryId))?.photos).toMatchObject([{ visibility: 'bench' }]);
  });

  it.each([
    ['2026-03-29T01:30', 'never showed this time'],
    ['2025-10-26T01:30', 'showed this time twice'],
    ['2026-04-16T09:40', 'still to come'],
    ['2026-13-01T09:40', 'no date and time'],
  ])('refuses to have happened at %s', async (occurredClock, words) => {
    const refused = addEntry(shop.technician, entry({ draft: { ...draft, occurredClock } }), {
      now,
    });
    const { fields } = await refused.then(
      () => expect.unreachable(),
      (error: Invalid) => error,
    );
    expect(fields['draft.occurredClock']).toContain(words);
  });

  it('happened by the shop’s clock, and rests from then', async () => {
    const when = { ...draft, rest, occurredClock: '2026-04-14T09:40' };
    const { entryId } = await addEntry(shop.technician, entry({ draft: when }), { now });
    const occurredAt = new Date('2026-04-14T08:40:00.000Z');
    expect(await find(entryId)).toMatchObject({ occurredAt, rest: { startedAt: occurredAt } });
  });
});

describe('who may write', () => {
  it('the front desk: photos and notes, not the bench’s figures', async () => {
    await addEntry(shop.desk, entry());
    for (const change of [{ rest }, { used: ['Glue'] }, { temperature: '21' }, { minutes: '5' }])
      await expect(
        addEntry(shop.desk, entry({ draft: { ...draft, ...change } })),
      ).rejects.toMatchObject({ code: 'not-allowed' });
  });

  it('the front desk changes its own drafts only; the bench anyone’s', async () => {
    const bench = await addEntry(shop.technician, entry());
    const desk = await addEntry(shop.desk, entry());
    await expect(
      editEntry(shop.desk, { ...entry(), entryId: bench.entryId }),
    ).rejects.toMatchObject({ code: 'not-allowed' });
    await editEntry(shop.technician, { ...entry(), entryId: desk.entryId });
  });

  it('no customer, and nobody for an unknown case or another case’s entry', async () => {
    const viewer = { kind: 'customer', customerId: repair.ownerId, name: 'X' } as const;
    await expect(addEntry(viewer, entry())).rejects.toMatchObject({ code: 'not-allowed' });
    await expect(
      addEntry(shop.technician, { ...entry(), caseNumber: '2026-999' }),
    ).rejects.toMatchObject({ code: 'not-found' });
    const other = await takeInCase(shop);
    const { entryId } = await addEntry(shop.technician, entry());
    await expect(
      editEntry(shop.technician, { ...entry(), caseNumber: other.number, entryId }),
    ).rejects.toMatchObject({ code: 'not-found' });
    await expect(
      addEntry(shop.technician, { ...entry(), caseNumber: other.number, entryId }),
    ).rejects.toMatchObject({ code: 'conflict' });
  });
});

describe('a case’s end', () => {
  it('takes no new entry, and keeps the entry it came in with', async () => {
    const closed = await takeInCase(shop);
    const first = await addEntry(shop.technician, { ...entry(), caseNumber: closed.number });
    await expect(
      removeDraft(shop.technician, { caseNumber: closed.number, entryId: first.entryId }),
    ).rejects.toMatchObject({ code: 'conflict' });
    await run('UPDATE cases SET closed_at = NOW(3) WHERE id = ?', [closed.id]);
    await expect(
      addEntry(shop.technician, { ...entry(), caseNumber: closed.number }),
    ).rejects.toMatchObject({ code: 'conflict' });
  });
});
