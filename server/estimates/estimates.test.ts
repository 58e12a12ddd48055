import { beforeAll, describe, expect, it } from 'vitest';
import { getCase } from '#server/cases/get-case.ts';
import { run } from '#server/db/sql.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { recordAnswer } from './record-answer.ts';
import { sendEstimate } from './send-estimate.ts';

useDatabase();

let shop: TestShop;
let repair: TestCase;
const now = new Date('2026-04-08T09:00:00.000Z');

beforeAll(async () => {
  shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  repair = await takeInCase(shop);
});

const send = (total: string, viewer = shop.desk) =>
  sendEstimate(viewer, { caseNumber: repair.number, summary: 'Bridge reglued', total }, { now });
const answer = (answer: string, revision: number, viewer = shop.desk) =>
  recordAnswer(viewer, { caseNumber: repair.number, answer, revision }, { now });
const state = async () => (await getCase(shop.desk, { number: repair.number })).state.state;

describe('an estimate', () => {
  it('refuses a total that is none, and who may not write one', async () => {
    await expect(send('1,200')).rejects.toMatchObject({
      fields: { total: expect.any(String) as string },
    });
    await expect(send('')).rejects.toMatchObject({
      fields: { total: expect.any(String) as string },
    });
    await expect(send('95', shop.technician)).rejects.toMatchObject({ code: 'not-allowed' });
    expect(await state()).toBe('bench');
  });

  it('makes the case wait; a revision replaces it', async () => {
    expect(await send('612')).toEqual({ revision: 1 });
    expect(await state()).toBe('owner');
    expect(await send('616.80')).toEqual({ revision: 2 });
    const { estimate } = await getCase(shop.desk, { number: repair.number });
    expect(estimate).toMatchObject({
      revision: 2,
      totalMinor: '61680',
      currency: 'GBP',
      answer: null,
    });
  });

  it('takes an answer to the newest revision only, from the front desk only', async () => {
    await expect(answer('authorised', 1)).rejects.toMatchObject({ code: 'conflict' });
    await expect(answer('authorised', 2, shop.owner)).rejects.toMatchObject({
      code: 'not-allowed',
    });
    await expect(answer('perhaps', 2)).rejects.toMatchObject({ code: 'invalid' });
  });

  it('is sealed when it is authorised, without its price in what may be shown', async () => {
    await answer('authorised', 2);
    expect(await state()).toBe('bench');
    const [event] = await listTimeline(shop.desk, { caseNumber: repair.number });
    expect(event).toMatchObject({ kind: 'authorisation', seal: { by: 'Sunniva Reed' } });
    // Its words, not its ids and digests: those may hold any digits.
    expect(`${event?.title} ${event?.text}`).not.toMatch(/616|61680/);
    await expect(answer('declined', 2)).rejects.toMatchObject({ code: 'conflict' });
  });

  it('lets the case go on when it is declined, and is not sent for a closed case', async () => {
    await send('95');
    await answer('declined', 3);
    expect(await state()).toBe('bench');
    await run('UPDATE cases SET closed_at = NOW(3) WHERE id = ?', [repair.id]);
    await expect(send('95')).rejects.toMatchObject({ code: 'conflict' });
  });
});
