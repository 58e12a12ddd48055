import { v7 } from 'uuid';
import { beforeAll, describe, expect, it } from 'vitest';
import { NotAllowed, NotFound } from '#domain/errors.ts';
import { PUBLIC, type Viewer } from '#domain/viewer.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { run } from '../db/sql.ts';
import { readVersion } from './read-version.ts';

useDatabase();

const AT = new Date('2026-04-16T09:40:00.000Z');
const [person, owner, stranger, instrument, record] = [v7(), v7(), v7(), v7(), v7()];
const staff: Viewer = {
  kind: 'staff',
  personId: person,
  role: 'desk',
  name: 'Ines Lund',
  number: 1,
  freshAt: AT,
};
const customer = (customerId: string): Viewer => ({ kind: 'customer', customerId, name: 'C' });

async function addCase(ordinal: number): Promise<string> {
  const id = v7();
  await run(
    `INSERT INTO cases (id, year, ordinal, record, tag_code, instrument_id, taken_in_by, taken_in_at,
       complaint, job, consent_photos) VALUES (?, 2026, ?, ?, ?, ?, ?, ?, 'Buzzes', 'Look at it', TRUE)`,
    [
      id,
      ordinal,
      Buffer.alloc(16, ordinal),
      `TAG${ordinal}`.padEnd(16, '0'),
      instrument,
      person,
      AT,
    ],
  );
  await run("INSERT INTO parties (case_id, part, customer_id) VALUES (?, 'owner', ?)", [id, owner]);
  return id;
}

let first: string;
beforeAll(async () => {
  await run(
    `INSERT INTO people (id, subject, name, role, number, created_at) VALUES (?, 's', 'Ines Lund', 'desk', 1, ?)`,
    [person, AT],
  );
  for (const id of [owner, stranger]) {
    await run('INSERT INTO customers (id, name, created_at) VALUES (?, ?, ?)', [id, 'C', AT]);
  }
  await run(
    "INSERT INTO instruments (id, owner_id, kind, maker, created_at) VALUES (?, ?, 'violin', ?, ?)",
    [instrument, owner, record.slice(0, 8), AT],
  );
  first = await addCase(31);
});

const bump = (id: string) => run('UPDATE cases SET version = version + 1 WHERE id = ?', [id]);
const one = (viewer: Viewer, number = '2026-031') => readVersion(viewer, { number });
const all = (viewer: Viewer) => readVersion(viewer, { number: null });

describe('the version of a case', () => {
  it('changes when the case does, for staff and its owner alike', async () => {
    const before = await one(staff);
    expect(await one(customer(owner))).toBe(before);
    await bump(first);
    expect(await one(staff)).not.toBe(before);
    expect(await one(customer(owner))).toBe(await one(staff));
  });

  it('is not told to a stranger, who cannot tell it from a case that is not there', async () => {
    const messages = [];
    for (const number of ['2026-031', '2026-999', 'x']) {
      const error: unknown = await one(customer(stranger), number).catch(
        (thrown: unknown) => thrown,
      );
      expect(error).toBeInstanceOf(NotFound);
      messages.push((error as NotFound).sentence);
    }
    expect(new Set(messages).size).toBe(1);
    await expect(one(PUBLIC)).rejects.toThrow(NotAllowed);
  });
});

describe('the version of a first page', () => {
  it('changes with any case on it, a new one, and one handed back', async () => {
    const seen = [await all(staff)];
    await bump(first);
    seen.push(await all(staff));
    const second = await addCase(32);
    seen.push(await all(staff));
    await run('UPDATE cases SET handed_back_at = ? WHERE id = ?', [AT, second]);
    seen.push(await all(staff));
    expect(seen[3]).toBe(seen[1]);
    expect(new Set(seen).size).toBe(3);
  });

  it('counts for a customer only their own cases, open or not', async () => {
    expect(await all(customer(stranger))).toBe('0-0');
    expect(await all(customer(owner))).toMatch(/^2-/);
  });
});
