import { beforeAll, describe, expect, it } from 'vitest';
import { takeIn } from '#server/cases/take-in.ts';
import { findCustomers } from '#server/customers/find-customers.ts';
import { anOwner, takeInForm } from '#tests/cases/take-in-form.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { findBySerial } from './find-by-serial.ts';

useDatabase();

let shop: TestShop;
let ownerId: string;
const instrument = { kind: 'Parlour guitar', maker: 'Perrin Kell', serial: 'K-0417' };

beforeAll(async () => {
  shop = await setUpShop();
  const owner = anOwner('Marguerite Osei');
  for (const day of ['2025-01-10', '2026-03-30'])
    await takeIn(shop.desk, takeInForm({ owner, instrument, job: `Came ${day}` }), {
      now: new Date(`${day}T10:00:00Z`),
    });
  const [found] = await findCustomers(shop.desk, { words: 'Osei' });
  ownerId = found?.id ?? '';
});

describe('a serial at the counter', () => {
  it('shows its history to the same owner, newest case first', async () => {
    const { same, asksForProof } = await findBySerial(shop.desk, { serial: ' k-0417 ', ownerId });
    expect(asksForProof).toBe(false);
    expect(same).toMatchObject([
      { kind: 'Parlour guitar', maker: 'Perrin Kell', serial: 'K-0417' },
    ]);
    expect(same[0]?.cases.map(({ number, job }) => [number, job])).toEqual([
      ['2026-001', 'Came 2026-03-30'],
      ['2025-001', 'Came 2025-01-10'],
    ]);
  });

  it('tells another person’s counter nothing but that proof is asked for', async () => {
    const other = await takeIn(shop.desk, takeInForm({ owner: anOwner('Other Person') }));
    expect(other.onHold).toBeNull();
    const [person] = await findCustomers(shop.desk, { words: 'Other Person' });
    for (const asking of [null, person?.id ?? ''])
      expect(await findBySerial(shop.desk, { serial: 'K-0417', ownerId: asking })).toEqual({
        same: [],
        asksForProof: true,
      });
  });

  it('says nothing of a serial that is new, or of none', async () => {
    const none = { same: [], asksForProof: false };
    expect(await findBySerial(shop.desk, { serial: 'K-0418', ownerId })).toEqual(none);
    expect(await findBySerial(shop.desk, { serial: '  ', ownerId: null })).toEqual(none);
  });
});
