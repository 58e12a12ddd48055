import { beforeAll, describe, expect, it } from 'vitest';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { anOwner, takeInForm } from '#tests/cases/take-in-form.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { getCase } from './get-case.ts';
import { recordProof } from './record-proof.ts';
import { takeIn } from './take-in.ts';

useDatabase();

let shop: TestShop;
beforeAll(async () => {
  shop = await setUpShop();
});

describe('proof of ownership', () => {
  it('lets a held case go on, and is written down for the bench alone', async () => {
    const instrument = { kind: 'Violin', maker: 'Tern & Lowe', serial: '7' };
    await takeIn(shop.desk, takeInForm({ owner: anOwner('First Person'), instrument }));
    const { number } = await takeIn(shop.desk, takeInForm({ instrument }));
    expect((await getCase(shop.desk, { number })).state.state).toBe('owner');
    const form = { caseNumber: number, proof: '' };
    await expect(recordProof(shop.desk, form)).rejects.toMatchObject({ code: 'invalid' });
    await recordProof(shop.desk, { ...form, proof: 'Bill of sale of 2024, seen and returned.' });
    expect((await getCase(shop.desk, { number })).state.state).toBe('bench');
    expect((await listTimeline(shop.desk, { caseNumber: number })).at(-1)).toMatchObject({
      visibility: 'bench',
      text: 'Bill of sale of 2024, seen and returned.',
    });
    await expect(recordProof(shop.desk, { ...form, proof: 'Again.' })).rejects.toMatchObject({
      code: 'conflict',
    });
  });
});
