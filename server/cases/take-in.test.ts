import { describe, expect, it, beforeAll } from 'vitest';
import type { Invalid } from '#domain/errors.ts';
import { PUBLIC } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { anOwner, takeInForm } from '#tests/cases/take-in-form.ts';
import { setUpShop, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { ASKS_FOR_PROOF } from '../instruments/keep-instrument.ts';
import { drawRecord, drawTagCode } from './draw-record.ts';
import { takeIn } from './take-in.ts';

useDatabase();

let shop: TestShop;
beforeAll(async () => {
  shop = await setUpShop();
});

const now = new Date('2026-03-30T09:12:00.000Z');
const rows = <T extends object>(sql: string, params: (string | number)[] = []) =>
  select<T>(sql, params);
const fields = (promise: Promise<unknown>) =>
  promise.then(
    () => ({}),
    (error: Invalid) => error.fields,
  );

describe('taking in', () => {
  it('makes a numbered case with its parties, its first draft and the receipt', async () => {
    const owner = anOwner('Marguerite Osei');
    const form = takeInForm({
      owner,
      promisedOn: '2026-04-24',
      technicianId: shop.technician.personId,
    });
    const { number, entryId, onHold } = await takeIn(shop.desk, form, { now });
    expect(number).toMatch(/^2026-\d{3}$/);
    expect(onHold).toBeNull();
    const [made] = await rows<{
      id: string;
      record: Buffer;
      tag_code: string;
      promised_on: string;
    }>('SELECT * FROM cases WHERE ordinal = ?', [Number(number.slice(5))]);
    expect(made?.record).toHaveLength(16);
    expect(made?.tag_code).toMatch(/^[0-9A-HJKMNP-TV-Z]{16}$/);
    expect(made).toMatchObject({ taken_in_at: now, job: 'Worn frets', consent_publish: 'number' });
    const parties = await rows<{ part: string; name: string }>(
      'SELECT p.part, c.name FROM parties p JOIN customers c ON c.id = p.customer_id WHERE case_id = ?',
      [made?.id ?? ''],
    );
    expect(parties.map(({ part }) => part).sort()).toEqual(['bringer', 'owner', 'payer']);
    expect(new Set(parties.map(({ name }) => name))).toEqual(new Set(['Marguerite Osei']));
    const [entry] = await rows<{ draft: string; phase: string; leaf_index: null }>(
      'SELECT * FROM entries WHERE id = ?',
      [entryId],
    );
    expect(entry).toMatchObject({ kind: 'entry', phase: 'before', leaf_index: null });
    const draft = JSON.parse(entry?.draft ?? '') as { title: string; text: string };
    expect(draft).toMatchObject({
      title: 'Taken in at the counter',
      text: 'Worn frets. Came with it: Soft bag.',
    });
    // The owner's own words can be erased by themselves: they are not in what may be shown.
    expect(entry?.draft).not.toContain('It buzzes');
    const [mail] = await rows<{ payload: string }>(
      "SELECT payload FROM outbox WHERE kind = 'mail' AND case_id = ?",
      [made?.id ?? ''],
    );
    expect(JSON.parse(mail?.payload ?? '')).toMatchObject({
      template: 'receipt',
      to: owner.email,
      data: { caseNumber: number, promisedOn: 'Friday 24 April 2026', accessories: 'Soft bag' },
    });
  });

  it('numbers without gaps however many are taken in at once, and when one fails', async () => {
    const series = 2031;
    const later = { now, series };
    const taken = await Promise.all([
      ...Array.from({ length: 12 }, () => takeIn(shop.desk, takeInForm(), later)),
      takeIn(
        shop.desk,
        takeInForm({ technicianId: shop.owner.personId.replace(/^.{4}/, 'ffff') }),
        later,
      ).catch(() => null),
    ]);
    const numbers = taken.flatMap((one) => (one ? [one.number] : [])).sort();
    expect(numbers).toEqual(
      Array.from({ length: 12 }, (_, index) => `2031-${String(index + 1).padStart(3, '0')}`),
    );
  });

  it('goes by the year of the shop, not of Greenwich', async () => {
    const { number } = await takeIn(shop.desk, takeInForm(), {
      now: new Date('2027-12-31T23:59:00Z'),
    });
    expect(number).toBe('2027-001');
  });

  it('makes one customer of one address taken in twice at once', async () => {
    const form = takeInForm({ owner: anOwner() });
    await Promise.all([takeIn(shop.desk, form, { now }), takeIn(shop.desk, form, { now })]);
    const same = await rows('SELECT id FROM customers WHERE email = ?', [form.owner.email]);
    expect(same).toHaveLength(1);
  });

  it('finds the customer again by address and name, and the instrument by maker and serial', async () => {
    const owner = anOwner();
    const instrument = { kind: 'Mandolin', maker: 'Tern & Lowe', serial: 'TL-77' };
    await takeIn(shop.desk, takeInForm({ owner, instrument }), { now });
    const again = {
      owner: { ...owner, name: 'orla vance' },
      instrument: { ...instrument, serial: 'tl-77' },
    };
    const { onHold } = await takeIn(shop.desk, takeInForm(again), { now });
    expect(onHold).toBeNull();
    expect(await rows('SELECT id FROM customers WHERE email = ?', [owner.email])).toHaveLength(1);
    expect(await rows("SELECT id FROM instruments WHERE serial = 'TL-77'")).toHaveLength(1);
  });

  it('holds a case whose serial is on record with another person, apart and without a word of it', async () => {
    const instrument = { kind: 'Mandolin', maker: 'Tern & Lowe', serial: 'TL-88' };
    await takeIn(shop.desk, takeInForm({ owner: anOwner('First Person'), instrument }), { now });
    const { onHold, number } = await takeIn(shop.desk, takeInForm({ instrument }), { now });
    expect(onHold).toBe(ASKS_FOR_PROOF);
    expect(onHold).not.toContain('First Person');
    const owners = await rows("SELECT owner_id FROM instruments WHERE serial = 'TL-88'");
    expect(owners).toHaveLength(2);
    const [held] = await rows('SELECT on_hold FROM cases WHERE year = 2026 AND ordinal = ?', [
      Number(number.slice(5)),
    ]);
    expect(held).toEqual({ on_hold: ASKS_FOR_PROOF });
  });

  it('keeps bringer and payer apart where they are other people', async () => {
    const form = takeInForm({ bringer: anOwner('A Parent'), payer: anOwner('Saltmere School') });
    const { entryId } = await takeIn(shop.desk, form, { now });
    const parties = await rows(
      `SELECT p.part, c.name FROM parties p JOIN customers c ON c.id = p.customer_id
       JOIN entries e ON e.case_id = p.case_id WHERE e.id = ? ORDER BY p.part`,
      [entryId],
    );
    expect(parties).toEqual([
      { part: 'owner', name: 'Orla Vance' },
      { part: 'bringer', name: 'A Parent' },
      { part: 'payer', name: 'Saltmere School' },
    ]);
  });

  it('refuses in the field’s own place, and writes nothing', async () => {
    const owner = anOwner();
    await takeIn(shop.desk, takeInForm({ owner }), { now });
    const before = await rows('SELECT COUNT(*) AS n FROM cases');
    const refused = (change: object) => fields(takeIn(shop.desk, takeInForm(change), { now }));
    expect(await refused({ owner: { ...owner, name: 'Somebody Else' } })).toHaveProperty([
      'owner.email',
    ]);
    expect(await refused({ owner: { id: shop.desk.personId } })).toHaveProperty(['owner']);
    expect(await refused({ instrument: { id: shop.desk.personId } })).toHaveProperty([
      'instrument',
    ]);
    expect(await refused({ promisedOn: '2026-03-29' })).toHaveProperty(['promisedOn']);
    expect(await refused({ promisedOn: '2036-03-29' })).toHaveProperty(['promisedOn']);
    expect(await refused({ technicianId: '0199c4a2-7f00-7000-8000-000000000001' })).toHaveProperty([
      'technicianId',
    ]);
    const instrument = { kind: 'Mandolin', maker: 'Tern & Lowe', declaredValue: '1,200' };
    expect(await refused({ instrument })).toHaveProperty(['instrument.declaredValue']);
    expect(await refused({ instrument: { ...instrument, serial: '9'.repeat(5000) } })).toEqual({
      'instrument.serial': 'The serial has 5000 characters; 80 is the most. Shorten it.',
    });
    expect(await rows('SELECT COUNT(*) AS n FROM cases')).toEqual(before);
  });

  it('is for the shop’s people alone', async () => {
    const customer = { kind: 'customer', customerId: shop.desk.personId, name: 'X' } as const;
    await expect(takeIn(customer, takeInForm())).rejects.toMatchObject({ code: 'not-allowed' });
    await expect(takeIn(PUBLIC, takeInForm())).rejects.toMatchObject({ code: 'not-allowed' });
  });
});

describe('what is drawn', () => {
  it('is never all zeros, which stand for the log itself', () => {
    const draws = [Buffer.alloc(16), Buffer.alloc(16, 7)];
    expect(drawRecord(() => draws.shift() ?? Buffer.alloc(0)).equals(Buffer.alloc(16, 7))).toBe(
      true,
    );
  });
  it('does not repeat', () => {
    expect(new Set(Array.from({ length: 500 }, drawTagCode)).size).toBe(500);
  });
});
