import { randomBytes, randomUUID } from 'node:crypto';
import { v7 } from 'uuid';
import type { Role, StaffViewer } from '#domain/viewer.ts';
import { run } from '#server/db/sql.ts';

/** A shop with one person of each role, for tests of the record. All names are invented. */
export interface TestShop {
  owner: StaffViewer;
  technician: StaffViewer;
  desk: StaffViewer;
}

const AT = new Date('2026-03-01T09:00:00.000Z');

async function person(role: Role, name: string, number: number): Promise<StaffViewer> {
  const personId = v7();
  await run(
    'INSERT INTO people (id, subject, name, role, number, created_at) VALUES (?, ?, ?, ?, ?, ?)',
    [personId, randomUUID(), name, role, number, AT],
  );
  return { kind: 'staff', personId, role, name, number, freshAt: AT };
}

/** Sets the shop up in this test file's database. */
export async function setUpShop(): Promise<TestShop> {
  await run(
    `INSERT INTO shops (id, name, place, address, telephone, email, currency, time_zone, warranty_terms, created_at)
     VALUES (1, 'Harrow Lane Repairs', 'Saltmere', '9 Harrow Lane, Saltmere', '0000 000 000',
             'bench@harrow.example', 'GBP', 'Europe/London',
             'It does not cover knocks, heavier strings than were fitted, or work by others.', ?)`,
    [AT],
  );
  return {
    owner: await person('proprietor', 'Quilla Marsh', 1),
    technician: await person('technician', 'Bram Ottway', 2),
    desk: await person('desk', 'Sunniva Reed', 3),
  };
}

/** A case of the test shop. */
export interface TestCase {
  id: string;
  number: string;
  record: Buffer;
  ownerId: string;
}

export const OWNER_NAME = 'Leopoldine Carrow';
export const OWNER_EMAIL = 'leopoldine@carrow.example';
export const SERIAL = 'PK-77419';

let ordinal = 0;

/** Takes an instrument in, with the owner as bringer and payer. */
export async function takeInCase(
  shop: TestShop,
  { consent = 'work' }: { consent?: 'number' | 'work' } = {},
): Promise<TestCase> {
  ordinal += 1;
  const made = { id: v7(), record: randomBytes(16), ownerId: v7() };
  const instrumentId = v7();
  await run('INSERT INTO customers (id, name, email, tell_by, created_at) VALUES (?, ?, ?, ?, ?)', [
    made.ownerId,
    OWNER_NAME,
    OWNER_EMAIL,
    'email',
    AT,
  ]);
  await run(
    `INSERT INTO instruments (id, owner_id, kind, maker, serial, created_at)
     VALUES (?, ?, 'Parlour guitar', 'Perrin Kell', ?, ?)`,
    [instrumentId, made.ownerId, SERIAL, AT],
  );
  await run(
    `INSERT INTO cases (id, year, ordinal, record, tag_code, instrument_id, taken_in_by, taken_in_at,
                        complaint, job, consent_photos, consent_publish)
     VALUES (?, 2026, ?, ?, ?, ?, ?, ?, 'It buzzes and the bridge lifts.', 'Bridge', TRUE, ?)`,
    [
      made.id,
      ordinal,
      made.record,
      randomBytes(8).toString('hex'),
      instrumentId,
      shop.desk.personId,
      AT,
      consent,
    ],
  );
  for (const part of ['owner', 'bringer', 'payer']) {
    await run('INSERT INTO parties (case_id, part, customer_id) VALUES (?, ?, ?)', [
      made.id,
      part,
      made.ownerId,
    ]);
  }
  return { ...made, number: `2026-${String(ordinal).padStart(3, '0')}` };
}
