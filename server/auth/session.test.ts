import { v7 } from 'uuid';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { PUBLIC } from '#domain/viewer.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { run, select } from '../db/sql.ts';
import { endSession } from './end-session.ts';
import { STAFF_IDLE_MS, CUSTOMER_MS } from './session-length.ts';
import { sessionViewer } from './session-viewer.ts';
import { startSession } from './start-session.ts';
import { sweepExpired } from './sweep-expired.ts';

useDatabase();

const AT = new Date('2026-04-16T09:40:00.000Z');
const later = (ms: number) => new Date(AT.getTime() + ms);
const HOUR = 60 * 60 * 1000;

let person: string;
let customer: string;

const request = (setCookie?: string) =>
  new Request('http://shop.test/bench', {
    headers: setCookie === undefined ? {} : { Cookie: setCookie.split(';')[0] ?? '' },
  });
const staffSession = (from?: string) =>
  startSession(request(from), { personId: person, freshAt: AT }, { now: AT });

beforeEach(async () => {
  [person, customer] = [v7(), v7()];
  await run('DELETE FROM sessions');
  await run('DELETE FROM people');
  await run(
    'INSERT INTO people (id, subject, name, role, number, created_at) VALUES (?, ?, ?, ?, ?, ?)',
    [person, `subject-${person}`, 'Ines Lund', 'desk', 3, AT],
  );
  await run('INSERT INTO customers (id, name, email, created_at) VALUES (?, ?, ?, ?)', [
    customer,
    'Marguerite Osei',
    `${customer}@osei.example`,
    AT,
  ]);
});

describe('a session', () => {
  it('stands for the person who signed in', async () => {
    expect(await sessionViewer(request(await staffSession()), { now: AT })).toEqual({
      kind: 'staff',
      personId: person,
      role: 'desk',
      name: 'Ines Lund',
      number: 3,
      freshAt: AT,
    });
    const cookie = await startSession(request(), { customerId: customer }, { now: AT });
    expect(await sessionViewer(request(cookie), { now: AT })).toEqual({
      kind: 'customer',
      customerId: customer,
      name: 'Marguerite Osei',
    });
  });

  it('is a cookie that scripts and other sites do not get', async () => {
    const cookie = await staffSession();
    expect(cookie).toMatch(/^witnessmark-session=/);
    expect(cookie).toContain('HttpOnly');
    expect(cookie).toContain('SameSite=Lax');
    expect(cookie).toContain('Path=/');
  });

  it('is not in the database in a form that opens it', async () => {
    const cookie = await staffSession();
    const signed = decodeURIComponent(cookie.split(/[=;]/)[1] ?? '');
    const id = JSON.parse(Buffer.from(signed.split('.')[0] ?? '', 'base64').toString()) as string;
    expect(Buffer.from(id, 'base64url')).toHaveLength(32);
    const [row] = await select<{ id_hash: Buffer }>('SELECT id_hash FROM sessions');
    expect(row?.id_hash).toHaveLength(32);
    expect(row?.id_hash.equals(Buffer.from(id, 'base64url'))).toBe(false);
  });

  it('is nobody’s without a cookie, with a made-up one, and with an altered one', async () => {
    const cookie = await staffSession();
    const altered = cookie.replace(/=(.)/, (_, first) => `=${first === 'I' ? 'J' : 'I'}`);
    for (const one of [undefined, 'witnessmark-session=abc', altered]) {
      expect(await sessionViewer(request(one), { now: AT })).toEqual(PUBLIC);
    }
  });

  it('gets a new id at each sign-in, and the old one is worth nothing', async () => {
    const first = await staffSession();
    const second = await staffSession(first);
    expect(second).not.toBe(first);
    expect(await sessionViewer(request(first), { now: AT })).toEqual(PUBLIC);
    expect((await sessionViewer(request(second), { now: AT })).kind).toBe('staff');
    expect(await select('SELECT 1 AS one FROM sessions')).toHaveLength(1);
  });

  it('ends at sign-out', async () => {
    const cookie = await staffSession();
    const emptied = await endSession(request(cookie));
    expect(emptied).toContain('Max-Age=0');
    expect(await sessionViewer(request(cookie), { now: AT })).toEqual(PUBLIC);
  });

  it('ends for staff twelve hours after the last page, not after the sign-in', async () => {
    const cookie = await staffSession();
    const kind = async (now: Date) => (await sessionViewer(request(cookie), { now })).kind;
    expect(await kind(later(11 * HOUR))).toBe('staff');
    expect(await kind(later(22 * HOUR))).toBe('staff');
    expect(await kind(later(22 * HOUR + STAFF_IDLE_MS + 1))).toBe('public');
  });

  it('ends for customers thirty days after the sign-in, used or not', async () => {
    const cookie = await startSession(request(), { customerId: customer }, { now: AT });
    const kind = async (now: Date) => (await sessionViewer(request(cookie), { now })).kind;
    expect(await kind(later(CUSTOMER_MS - 1))).toBe('customer');
    expect(await kind(later(CUSTOMER_MS))).toBe('public');
  });

  it('ends with the person: removed from the shop, or erased', async () => {
    const staff = await staffSession();
    await run('UPDATE people SET removed_at = ? WHERE id = ?', [AT, person]);
    expect(await sessionViewer(request(staff), { now: AT })).toEqual(PUBLIC);
    const owner = await startSession(request(), { customerId: customer }, { now: AT });
    await run('UPDATE customers SET erased_at = ? WHERE id = ?', [AT, customer]);
    expect(await sessionViewer(request(owner), { now: AT })).toEqual(PUBLIC);
  });

  it('takes the role of now, not of the sign-in', async () => {
    const cookie = await staffSession();
    await run("UPDATE people SET role = 'technician' WHERE id = ?", [person]);
    expect(await sessionViewer(request(cookie), { now: AT })).toMatchObject({ role: 'technician' });
  });

  it('is written down in the audit record', async () => {
    await staffSession();
    const acts = await select('SELECT act FROM audit_records WHERE person_id = ?', [person]);
    expect(acts).toEqual([{ act: 'signed in' }]);
  });

  it('is swept away once it has ended', async () => {
    await staffSession();
    await sweepExpired({ now: later(STAFF_IDLE_MS - 1) });
    expect(await select('SELECT 1 AS one FROM sessions')).toHaveLength(1);
    await sweepExpired({ now: later(STAFF_IDLE_MS) });
    expect(await select('SELECT 1 AS one FROM sessions')).toHaveLength(0);
  });
});

describe('the cookies of a shop that people reach by https', () => {
  it('are refused by browsers on plain or sibling pages', async () => {
    vi.resetModules();
    const { env } = await import('../env.ts');
    const { codeCookie, sessionCookie } = await import('./cookies.ts');
    env().PUBLIC_URL = 'https://shop.example';
    const session = await sessionCookie().serialize('id');
    expect(session).toMatch(/^__Host-witnessmark-session=/);
    expect(session).toContain('Secure');
    expect(session).not.toContain('Domain');
    expect(await codeCookie().serialize('id')).toMatch(
      /^__Secure-witnessmark-code=.*Path=\/sign-in.*Secure/,
    );
  });
});
