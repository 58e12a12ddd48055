import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import type { CustomerViewer } from '#domain/viewer.ts';
import { PUBLIC } from '#domain/viewer.ts';
import { run } from '#server/db/sql.ts';
import { addEntry } from '#server/entries/add-entry.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { sendEstimate } from '#server/estimates/send-estimate.ts';
import { countQueries } from '#tests/cases/count-queries.ts';
import { addPhoto } from '#tests/record/entries.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { findCases } from './find-cases.ts';
import { getCase } from './get-case.ts';
import { getOwnCase } from './get-own-case.ts';
import { listOwnInstruments } from './list-own-instruments.ts';
import { listRack } from './list-rack.ts';
import { setNextStep } from './set-next-step.ts';
import { tellOwner } from './tell-owner.ts';

useDatabase();

let shop: TestShop;
let few: TestCase;
let many: TestCase;
const owner = (repair: TestCase): CustomerViewer => ({
  kind: 'customer',
  customerId: repair.ownerId,
  name: 'Leopoldine Carrow',
});

/** A case with `entries` entries of ten photos each, and a rest in each. */
async function caseWith(entries: number): Promise<TestCase> {
  const repair = await takeInCase(shop);
  const rest = { product: 'Glue', clampsOffHours: '2', workedHours: null, stringsHours: null };
  for (let n = 0; n < entries; n += 1) {
    const { entryId } = await addEntry(shop.technician, {
      caseNumber: repair.number,
      phase: 'during',
      visibility: 'shared',
      draft: { title: `Step ${n}`, rest },
    });
    const photos = entries === 1 ? 3 : 10;
    for (let photo = 0; photo < photos; photo += 1)
      await addPhoto(repair, entryId, shop.technician);
  }
  return repair;
}

beforeAll(async () => {
  shop = await setUpShop();
  few = await caseWith(1);
  many = await caseWith(6);
});

describe('the number of queries', () => {
  it('of a timeline is the same for 3 photos in 1 entry and 60 in 6', async () => {
    const reads = (repair: TestCase) =>
      countQueries(async () => {
        await getCase(shop.technician, { number: repair.number });
        return listTimeline(shop.technician, { caseNumber: repair.number });
      });
    const [small, large] = [await reads(few), await reads(many)];
    expect(small.value.flatMap(({ photos }) => photos)).toHaveLength(3);
    expect(large.value.flatMap(({ photos }) => photos)).toHaveLength(60);
    expect(large.count).toBe(small.count);
    expect(large.count).toBeLessThanOrEqual(11);
  });

  it('of a portal case is the same too', async () => {
    const reads = (repair: TestCase) =>
      countQueries(async () => {
        await getOwnCase(owner(repair), { number: repair.number });
        await listTimeline(owner(repair), { caseNumber: repair.number });
      });
    expect((await reads(many)).count).toBe((await reads(few)).count);
  });

  it('of the Rack, a search and the portal’s list does not grow with the cases', async () => {
    const reads = () =>
      countQueries(async () => ({
        rack: await listRack(shop.technician),
        found: await findCases(shop.technician, { words: 'Carrow' }),
        own: await listOwnInstruments(owner(few)),
      }));
    const before = await reads();
    for (let n = 0; n < 12; n += 1) await takeInCase(shop);
    const after = await reads();
    expect(after.value.rack).toHaveLength(before.value.rack.length + 12);
    expect(after.value.found).toHaveLength(before.value.found.length + 12);
    expect(after.count).toBe(before.count);
    expect(after.count).toBeLessThanOrEqual(15);
  });
});

describe('the Rack', () => {
  const on = async (repair: TestCase, now = new Date()) =>
    (await listRack(shop.desk, {}, { now })).find(({ number }) => number === repair.number);

  it('tells what each case waits for, from the facts alone', async () => {
    const repair = await takeInCase(shop);
    expect(await on(repair)).toMatchObject({
      state: { state: 'bench' },
      maker: 'Perrin Kell',
      owner: 'Leopoldine Carrow',
    });
    await sendEstimate(shop.desk, { caseNumber: repair.number, summary: 'Refret', total: '408' });
    expect(await on(repair)).toMatchObject({
      state: { state: 'owner' },
      estimate: { totalMinor: '40800' },
    });
    await run('UPDATE cases SET closed_at = NOW(3) WHERE id = ?', [repair.id]);
    expect(await on(repair)).toMatchObject({ state: { state: 'home' } });
    await tellOwner(shop.desk, { caseNumber: repair.number });
    expect((await on(repair))?.ownerToldAt).toBeInstanceOf(Date);
    await run('UPDATE cases SET handed_back_at = NOW(3) WHERE id = ?', [repair.id]);
    expect(await on(repair)).toBeUndefined();
  });

  it('rests, and is on the bench again once the time has come', async () => {
    const now = new Date();
    const later = (hours: number) => new Date(now.getTime() + hours * 3_600_000);
    expect(await on(few, later(1))).toMatchObject({
      state: { state: 'rest', next: { name: 'clamps off' } },
    });
    expect(await on(few, later(3))).toMatchObject({
      state: { state: 'bench', over: { name: 'clamps off' } },
    });
  });

  it('shows one person’s work, what is next, and the first photo', async () => {
    await setNextStep(shop.desk, {
      caseNumber: few.number,
      nextStep: 'Level the new frets',
      technicianId: shop.technician.personId,
    });
    const [mine, ...others] = await listRack(shop.desk, { technicianId: shop.technician.personId });
    expect(others).toEqual([]);
    expect(mine).toMatchObject({
      number: few.number,
      technician: 'Bram Ottway',
      nextStep: 'Level the new frets',
      thumb: { width: 4000, height: 3000 },
    });
    await expect(
      setNextStep(shop.desk, { caseNumber: few.number, technicianId: v7() }),
    ).rejects.toMatchObject({
      fields: { technicianId: expect.stringContaining('not in the shop') as string },
    });
  });

  it('is not for customers or the public', async () => {
    await expect(listRack(owner(few))).rejects.toMatchObject({ code: 'not-allowed' });
    await expect(listRack(PUBLIC)).rejects.toMatchObject({ code: 'not-allowed' });
    await expect(findCases(owner(few), { words: 'Carrow' })).rejects.toMatchObject({
      code: 'not-allowed',
    });
    await expect(getCase(owner(few), { number: few.number })).rejects.toMatchObject({
      code: 'not-allowed',
    });
  });
});

describe('finding a case', () => {
  const numbers = async (words: string) =>
    (await findCases(shop.desk, { words })).map(({ number }) => number);

  it('by number, short number, serial, owner, maker and kind', async () => {
    expect(await numbers(few.number)).toEqual([few.number]);
    expect(await numbers(few.number.slice(5))).toEqual([few.number]);
    expect(await numbers('1')).toEqual([few.number]);
    for (const words of ['PK-77', 'carrow', 'perrin', 'PARLOUR'])
      expect(await numbers(words)).toContain(few.number);
  });

  it('finds nothing for nothing, wildcards or a number that is none', async () => {
    for (const words of ['', '  ', '%', '_', '2026-998', 'x'.repeat(9000)])
      expect(await numbers(words)).toEqual([]);
  });
});

describe('a customer', () => {
  it('sees where their own instruments are, and no word of a draft', async () => {
    const own = await listOwnInstruments(owner(few));
    expect(own).toMatchObject([{ number: few.number, state: { state: 'rest' }, thumb: null }]);
    const case1 = await getOwnCase(owner(few), { number: few.number });
    expect(JSON.stringify(case1)).not.toContain('Step 0');
    expect(case1).not.toHaveProperty('nextStep');
    expect(await listTimeline(owner(few), { caseNumber: few.number })).toEqual([]);
  });

  it.each(['2026-002', '2026-999', '2026-1', '', "2026-001' OR '1"])(
    'finds nothing under %j that is not theirs',
    async (number) => {
      await expect(getOwnCase(owner(few), { number })).rejects.toMatchObject({ code: 'not-found' });
      await expect(listTimeline(owner(few), { caseNumber: number })).rejects.toMatchObject({
        code: 'not-found',
      });
    },
  );

  it('is told apart from staff: the portal’s reads are not for the shop’s people', async () => {
    await expect(listOwnInstruments(shop.owner)).rejects.toMatchObject({ code: 'not-allowed' });
  });
});
