import { buffer } from 'node:stream/consumers';
import { RouterContextProvider } from 'react-router';
import { beforeAll, beforeEach, describe, expect, it, vi } from 'vitest';
import type { StaffViewer } from '#domain/viewer.ts';
import { run, select } from '#server/db/sql.ts';
import { requestContext } from '#server/http/context.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { signHead } from '#server/evidence/sign-head.ts';
import { continueWarranty } from '#server/warranty/continue-warranty.ts';
import { issueWarranty } from '#server/warranty/issue-warranty.ts';
import { readPaper } from '#server/warranty/read-paper.ts';
import { unsafeWarranty, type Warranty } from '#server/warranty/warranty.ts';
import { formatCode } from '#evidence/code/format-code.ts';
import { qrFragment } from '#evidence/code/qr-fragment.ts';
import { currentKey } from '#server/evidence/current-key.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { useStore } from '#tests/setup/store.ts';
import { closedCase } from '#tests/record/closed-case.ts';
import { OWNER_EMAIL, OWNER_NAME, SERIAL, setUpShop } from '#tests/record/shop.ts';
import { loader as checkpoint } from '../api/log-checkpoint.ts';
import { loader as entries } from '../api/log-entries.ts';
import { loader as keys } from '../api/log-keys.ts';
import { loader as record } from '../api/verify.ts';
import { checkHere } from './check-here.ts';
import { loader as page } from './code.tsx';
import { loader as log } from './log.tsx';

useDatabase();
useStore();

const NOW = new Date('2026-04-24T15:05:00.000Z');
const WHERE = { host: 'shop.example', shop: 'Harrow Lane Repairs', zone: 'Europe/London' };
let open: Warranty;
let closed: Warranty;
let desk: StaffViewer;

async function issue(shop: Awaited<ReturnType<typeof setUpShop>>, consent: 'work' | 'number') {
  const repair = await closedCase(shop, { now: NOW, consent });
  const work = [{ text: 'Bridge reglued', personId: shop.technician.personId }];
  const { warrantyId } = await issueWarranty(
    shop.desk,
    { caseNumber: repair.number, months: 24, work },
    { now: NOW },
  );
  await continueWarranty(warrantyId, { now: NOW });
  return unsafeWarranty(warrantyId);
}

beforeAll(async () => {
  const shop = await setUpShop();
  desk = shop.desk;
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  open = await issue(shop, 'work');
  closed = await issue(shop, 'number');
  await signHead({ now: NOW });
});
beforeEach(() => run('DELETE FROM rate_counts'));

function args(path: string, params: Record<string, string> = {}) {
  const context = new RouterContextProvider();
  context.set(requestContext, { id: 'r', ip: '192.0.2.7', pattern: null });
  const url = new URL(path, 'http://127.0.0.1:3000');
  return { request: new Request(url), url, params, context, pattern: '' } as never;
}

const respond = async (path: string): Promise<Response> => {
  const [, code] = /^\/api\/verify\/(.+)$/.exec(path) ?? [];
  if (code !== undefined) return record(args(path, { code }));
  if (path.startsWith('/api/log/keys')) return keys();
  if (path.startsWith('/api/log/entries')) return entries(args(path));
  return checkpoint();
};
const known = async (code: string) => {
  const answer = (await page(args(`/verify/${code}`, { code }))) as {
    data: { known: object | null; sentence: string };
    init: { status?: number } | null;
  };
  return { ...answer.data, status: answer.init?.status ?? 200 };
};

describe('what anyone may ask', () => {
  it('says of a known number only what the shop says, and never that it was checked', async () => {
    const { known: view, sentence, status } = await known(open.code);
    expect(status).toBe(200);
    expect(sentence).toMatch(/^Known\. Your paper has not been checked/);
    const text = JSON.stringify(view);
    expect(text).toContain('Not checked in your browser');
    expect(text).toContain('Parlour guitar, Perrin Kell, serial …19');
    expect(text).not.toMatch(/"result":"good"|Intact/);
  });

  it('shows number and standing alone where the owner wants no more', async () => {
    const text = JSON.stringify(await known(closed.code));
    expect(text).toContain('In force');
    expect(text).not.toMatch(/Perrin Kell|Bridge reglued|…19/);
    const body = await (await respond(`/api/verify/${closed.code}`)).text();
    expect(body).not.toMatch(/Perrin Kell|Bridge reglued|…19/);
  });

  it('does not know a number that was not issued, is mistyped or is still on its way', async () => {
    expect(await known('0000000000' + '0')).toMatchObject({ known: null, status: 404 });
    expect(await known('ABC')).toMatchObject({ known: null, status: 404 });
    expect((await respond('/api/verify/00000000000')).status).toBe(404);
    await run("UPDATE warranties SET step = 'paper' WHERE id = ?", [open.id]);
    expect(await known(open.code)).toMatchObject({ known: null, status: 404 });
    expect((await respond(`/api/verify/${open.code}`)).status).toBe(404);
    await run("UPDATE warranties SET step = 'issued' WHERE id = ?", [open.id]);
    await expect(
      page(args('/', { code: formatCode(open.code).toLowerCase() })),
    ).rejects.toMatchObject({
      status: 302,
    });
  });

  it('answers known and unknown numbers no sooner than each other, and not without end', async () => {
    for (const code of [open.code, '00000000000']) {
      const start = performance.now();
      await respond(`/api/verify/${code}`);
      expect(performance.now() - start, code).toBeGreaterThanOrEqual(249);
    }
    await run('UPDATE rate_counts SET points = 120');
    const refused = await respond(`/api/verify/${open.code}`);
    expect(refused.status).toBe(429);
    expect(await refused.json()).toMatchObject({
      sentence: expect.stringMatching(
        /^Too many numbers were asked for from here\. Wait \d+ minutes/,
      ),
    });
  });

  it('gives out no name, address or whole serial of anybody', async () => {
    const people = await select<{ name: string }>('SELECT name FROM people');
    const secret = [OWNER_NAME, OWNER_EMAIL, SERIAL, 'Clamp 4', 'buzzes'].concat(
      people.map(({ name }) => name),
    );
    const paths = [open.code, closed.code].map((code) => `/api/verify/${code}`);
    const texts = await Promise.all(
      [...paths, '/api/log/checkpoint', '/api/log/entries', '/api/log/keys'].map(async (path) =>
        Buffer.from(await (await respond(path)).arrayBuffer()).toString('latin1'),
      ),
    );
    texts.push(JSON.stringify([await known(open.code), await known(closed.code), await log()]));
    for (const word of secret) {
      for (const text of texts) expect(text.includes(word), word).toBe(false);
    }
  });
});

describe('checked in the browser', () => {
  beforeEach(() => {
    vi.stubGlobal('fetch', (path: string) => respond(path));
    return () => vi.unstubAllGlobals();
  });
  const check = (warranty: Warranty, fragment = '', bytes: Uint8Array | null = null) =>
    checkHere(
      { code: warranty.code, fragment, paper: bytes && { name: 'paper.pdf', bytes } },
      WHERE,
    );
  const fragmentOf = async ({ seal }: Warranty) =>
    qrFragment(new Uint8Array(seal!), (await currentKey('log')).id);

  it('a number alone is known, its record whole, its paper unchecked', async () => {
    const checked = await check(open);
    expect(checked).toMatchObject({ kind: 'not-fully-checked', standing: { word: 'in force' } });
    expect(checked!.rows.filter(({ result }) => result === 'bad')).toEqual([]);
    const later = checked!.rows.find(({ held }) => held === 'Anything later');
    expect(later).toMatchObject({ result: 'good' });
    const time = checked!.rows.find(({ held }) => held === 'Time');
    expect(time).toMatchObject({ result: 'open', word: 'The shop’s word' });
  });

  it('a QR code of it is Intact and in force; one of another paper does not match', async () => {
    const good = await check(open, await fragmentOf(open));
    expect([good!.kind, good!.standing.word]).toEqual(['intact', 'in force']);
    const bad = await check(open, await fragmentOf(closed));
    expect(bad).toMatchObject({ kind: 'does-not-match', recordHolds: true });
    const strange = (await fragmentOf(open)).replace(/.{22}$/, 'AAAAAAAAAAAAAAAAAAAAAA');
    expect((await check(open, strange))!.kind).toBe('does-not-match');
    expect((await check(open, '#1.nonsense'))!.rows[0]).toMatchObject({ word: 'Not read' });
  });

  it('knows the very PDF, one added to, another file of the warranty, and another', async () => {
    const pdf = await paperOf(open);
    expect((await check(open, '', pdf))!.kind).toBe('intact');
    const added = await check(open, '', Buffer.concat([pdf, Buffer.from('%more')]));
    expect(added).toMatchObject({ kind: 'not-fully-checked' });
    expect(added!.rows[0]).toMatchObject({ word: 'Added to' });
    const edited = Buffer.from(pdf);
    edited[pdf.length - 2000]! ^= 1;
    expect((await check(open, '', edited))!.rows[0]).toMatchObject({ word: 'Other file' });
    expect(await check(open, '', Buffer.from('%PDF-1.7 nothing'))).toMatchObject({
      kind: 'does-not-match',
      standing: { word: 'in force' },
    });
    expect((await check(open, '', await paperOf(closed)))!.kind).toBe('does-not-match');
  });

  it('checks with the PDF what the owner lets nobody see without it', async () => {
    const without = await check(closed, await fragmentOf(closed));
    expect(without).toMatchObject({ kind: 'not-fully-checked', subject: null });
    const withPaper = await check(closed, '', await paperOf(closed));
    expect(withPaper).toMatchObject({
      kind: 'intact',
      standing: { word: 'in force' },
      subject: { work: 'Bridge reglued' },
    });
  });

  it('finds a record that was tampered with on the way', async () => {
    vi.stubGlobal('fetch', async (path: string) => {
      const answer = await respond(path);
      if (!path.startsWith('/api/verify/')) return answer;
      const text = await answer.text();
      return new Response(text.replace('The case is closed.', 'The case is cloced.'));
    });
    const checked = await check(open, await fragmentOf(open));
    expect(checked).toMatchObject({
      kind: 'does-not-match',
      recordHolds: false,
      standing: { word: 'not stated here' },
    });
  });

  it('says that the shop does not answer', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('network')));
    await expect(check(open)).rejects.toThrow('The shop does not answer. Try again in a minute.');
    vi.stubGlobal('fetch', (path: string) => respond(path));
    expect(await checkHere({ code: '00000000000', fragment: '', paper: null }, WHERE)).toBeNull();
  });
});

async function paperOf({ id }: Warranty): Promise<Buffer> {
  const [paper] = await select<{ id: string }>('SELECT id FROM papers WHERE warranty_id = ?', [id]);
  return buffer(await (await readPaper(desk, { paperId: paper!.id })).open());
}
