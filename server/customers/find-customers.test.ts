import { beforeAll, describe, expect, it } from 'vitest';
import { takeIn } from '#server/cases/take-in.ts';
import { run } from '#server/db/sql.ts';
import { takeInForm } from '#tests/cases/take-in-form.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { findCustomers, MOST_FOUND } from './find-customers.ts';
import { readCustomer } from './read-customer.ts';

useDatabase();

let shop: TestShop;
const customer = (name: string, more: object) => ({ name, tellBy: 'email', ...more });

beforeAll(async () => {
  shop = await setUpShop();
  for (const owner of [
    customer('Dana Whitlock', { email: 'dana@whitlock.example', telephone: '+00 (0)555 123-456' }),
    customer('100 % Strings', { email: 'strings@hundred.example' }),
    ...Array.from({ length: 12 }, (_, n) =>
      customer(`Choir ${n}`, { email: `c${n}@choir.example` }),
    ),
  ])
    await takeIn(shop.desk, takeInForm({ owner }));
});

const names = async (words: string) =>
  (await findCustomers(shop.desk, { words })).map(({ name }) => name);

describe('finding a customer', () => {
  it.each(['whitl', 'DANA', 'dana@', '555123', '123 456', '0555-1234'])('by %j', async (words) => {
    expect(await names(words)).toEqual(['Dana Whitlock']);
  });

  it('finds nothing for too little, and takes wildcards literally', async () => {
    expect(await names('d')).toEqual([]);
    expect(await names('')).toEqual([]);
    expect(await names('%%')).toEqual([]);
    expect(await names('0 %')).toEqual(['100 % Strings']);
    expect(await names('__')).toEqual([]);
    expect(await names("' OR 1=1 -- ")).toEqual([]);
  });

  it('lists no more than it says', async () => {
    expect(await names('choir')).toHaveLength(MOST_FOUND);
  });

  it('leaves out who was erased', async () => {
    const [found] = await findCustomers(shop.desk, { words: 'Choir 7' });
    if (!found) return expect.unreachable();
    expect(await readCustomer(shop.desk, { id: found.id })).toEqual(found);
    await run('UPDATE customers SET erased_at = NOW(3) WHERE id = ?', [found.id]);
    expect(await names('Choir 7')).toEqual([]);
    await expect(readCustomer(shop.desk, { id: found.id })).rejects.toMatchObject({
      code: 'not-found',
    });
  });

  it('is for the shop’s people alone', async () => {
    const viewer = { kind: 'customer', customerId: shop.desk.personId, name: 'X' } as const;
    await expect(findCustomers(viewer, { words: 'dana' })).rejects.toMatchObject({
      code: 'not-allowed',
    });
  });
});
