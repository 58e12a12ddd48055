import { randomBytes } from 'node:crypto';
import { once } from 'node:events';
import { request as httpRequest, type IncomingMessage } from 'node:http';
import { text } from 'node:stream/consumers';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { v7 } from 'uuid';
import { startSession } from '#server/auth/start-session.ts';
import { run, select } from '#server/db/sql.ts';
import { listObjects } from '#server/storage/objects.ts';
import { useAppDatabase } from '#tests/access/app-database.ts';
import { Visitor } from '#tests/access/visitor.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { startApp } from '#tests/setup/app.ts';
import { aJpeg, aPng } from './pictures.ts';
import { sha256Of } from './sending.ts';

const app = await startApp();
useAppDatabase(app);

let shop: TestShop;
let repair: TestCase;
let technician: Visitor;
let owner: Visitor;

async function signedIn(holder: Parameters<typeof startSession>[1]): Promise<Visitor> {
  const visitor = new Visitor(app.url);
  visitor.take(await startSession(new Request(app.url), holder));
  return visitor;
}

beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
  const { personId } = shop.technician;
  technician = await signedIn({ personId, freshAt: new Date() });
  owner = await signedIn({ customerId: repair.ownerId });
});

/** How many photos and originals are kept; copies are made meanwhile by the program's own worker. */
async function whatIsKept(): Promise<{ photos: number; originals: number }> {
  const [row] = await select<{ photos: string }>('SELECT COUNT(*) AS photos FROM photos');
  let originals = 0;
  for await (const page of listObjects('originals')) originals += page.length;
  return { photos: Number(row?.photos), originals };
}

const addressOf = (photoId: string) => `/api/cases/${repair.number}/photos/${photoId}`;

const headersFor = (file: Uint8Array, change: Record<string, string> = {}) => ({
  Origin: app.url,
  'Content-Type': 'image/jpeg',
  'X-Content-SHA256': sha256Of(file),
  'X-File-Name': encodeURIComponent('Brücke 1.jpg'),
  ...change,
});

const put = (visitor: Visitor, file: Uint8Array, change = {}, photoId = v7()) =>
  visitor.send(addressOf(photoId), {
    method: 'PUT',
    body: new Uint8Array(file),
    headers: headersFor(file, change),
  });

let salt = 5000;
/** A photo of 3 MB, more than anything on the way buffers. */
async function aLongJpeg(): Promise<Buffer> {
  return Buffer.concat([await aJpeg({ salt: (salt += 1) }), randomBytes(3_000_000)]);
}

/** A PUT whose bytes are sent by hand. */
function slowPut(file: Uint8Array, visitor: Visitor, photoId = v7()) {
  const name = 'witnessmark-session';
  const cookie = `${name}=${visitor.cookie(name)}`;
  const request = httpRequest(new URL(addressOf(photoId), app.url), {
    method: 'PUT',
    headers: { ...headersFor(file), 'Content-Length': file.length, Cookie: cookie },
  });
  const answered = once(request, 'response').then(async ([response]) => ({
    status: (response as IncomingMessage).statusCode,
    body: JSON.parse(await text(response as IncomingMessage)) as Record<string, unknown>,
  }));
  return { request, answered };
}

describe('a photo sent by PUT', { timeout: 120_000 }, () => {
  it('is answered 201, then 200, and comes back byte for byte', async () => {
    const file = await aLongJpeg();
    const photoId = v7();
    const answer = await put(technician, file, {}, photoId);
    expect(answer.status).toBe(201);
    expect(await answer.json()).toEqual({
      photo: { id: photoId, number: 1, sha256: sha256Of(file) },
      linked: null,
    });
    expect((await put(technician, file, {}, photoId)).status).toBe(200);
    expect((await put(technician, file)).status).toBe(200);

    const original = await technician.send(`/api/media/${photoId}/original`);
    expect(original.status).toBe(200);
    expect(Object.fromEntries(original.headers)).toMatchObject({
      'content-type': 'image/jpeg',
      'content-length': String(file.length),
      'content-disposition': `attachment; filename="${repair.number}-photo-1.jpg"`,
      'cache-control': 'private, max-age=604800, immutable',
      'x-content-type-options': 'nosniff',
      'accept-ranges': 'bytes',
      etag: `"${sha256Of(file)}"`,
    });
    expect(sha256Of(new Uint8Array(await original.arrayBuffer()))).toBe(sha256Of(file));
  });

  it('is given in part, by its head alone, or not at all when it is there already', async () => {
    const file = await aLongJpeg();
    const photoId = v7();
    await put(technician, file, {}, photoId);
    const ask = (headers: Record<string, string>, method = 'GET') =>
      technician.send(`/api/media/${photoId}/original`, { headers, method });

    const part = await ask({ Range: 'bytes=-1000' });
    expect(part.status).toBe(206);
    expect(part.headers.get('content-range')).toBe(
      `bytes ${file.length - 1000}-${file.length - 1}/${file.length}`,
    );
    expect(Buffer.from(await part.arrayBuffer()).equals(file.subarray(-1000))).toBe(true);

    const outside = await ask({ Range: `bytes=${file.length}-` });
    expect([outside.status, outside.headers.get('content-range')]).toEqual([
      416,
      `bytes */${file.length}`,
    ]);
    const head = await ask({}, 'HEAD');
    expect([head.status, head.headers.get('content-length'), await head.text()]).toEqual([
      200,
      String(file.length),
      '',
    ]);
    const partHead = await ask({ Range: 'bytes=0-9' }, 'HEAD');
    expect([partHead.status, partHead.headers.get('content-length')]).toEqual([206, '10']);
    expect((await ask({ 'If-None-Match': `"${sha256Of(file)}"` })).status).toBe(304);
  });

  it('gets its copies from the worker, for the shop and not yet for the owner', async () => {
    const photoId = v7();
    await put(technician, await aJpeg({ width: 480, height: 320, salt: (salt += 1) }), {}, photoId);
    const ready = async () =>
      (await technician.send(`/api/media/${photoId}/320`, { method: 'HEAD' })).status === 200;
    await vi.waitUntil(ready, { timeout: 100_000, interval: 200 });
    const copy = await technician.send(`/api/media/${photoId}/2048`);
    expect(copy.headers.get('content-type')).toBe('image/webp');
    expect(copy.headers.get('content-disposition')).toBeNull();
    const bytes = new Uint8Array(await copy.arrayBuffer());
    expect(copy.headers.get('etag')).toBe(`"${sha256Of(bytes)}"`);
    for (const size of ['original', '2048', '320'])
      expect((await owner.send(`/api/media/${photoId}/${size}`)).status).toBe(404);
  });
});

describe('what is refused', () => {
  const refused = async (answer: Response) => {
    const { code, sentence } = (await answer.json()) as { code: string; sentence: string };
    expect(sentence).toMatch(/\.$/);
    return [answer.status, code];
  };

  it('answers with code and sentence, also before all of it was sent, and keeps nothing', async () => {
    const before = await whatIsKept();
    const long = await aLongJpeg();
    const words = Buffer.concat([Buffer.from('Dear shop'), randomBytes(3_000_000)]);
    const sixty = Buffer.alloc(60_000_000, 1);
    expect(await refused(await put(technician, words))).toEqual([415, 'unsupported']);
    expect(await refused(await put(technician, sixty))).toEqual([413, 'too-large']);
    expect(await refused(await put(technician, await aPng()))).toEqual([415, 'unsupported']);
    const cut = await aJpeg({ salt: (salt += 1) });
    expect(await refused(await put(technician, cut.subarray(0, -30)))).toEqual([400, 'invalid']);
    const other = { 'X-Content-SHA256': 'ab'.repeat(32) };
    expect(await refused(await put(technician, long, other))).toEqual([400, 'arrived-damaged']);
    expect(await refused(await put(new Visitor(app.url), long))).toEqual([401, 'signed-out']);
    expect(await refused(await put(owner, long))).toEqual([403, 'not-allowed']);
    const elsewhere = { Origin: 'https://elsewhere.example' };
    expect(await refused(await put(technician, long, elsewhere))).toEqual([403, 'other-origin']);
    const unknown = await technician.send(`/api/cases/2026-999/photos/${v7()}`, {
      method: 'PUT',
      body: new Uint8Array(long),
      headers: headersFor(long),
    });
    expect(await refused(unknown)).toEqual([404, 'not-found']);
    expect(await whatIsKept()).toEqual(before);
  });

  it('a session that ends while the photo goes up: 401 with its sentence, nothing kept', async () => {
    const before = await whatIsKept();
    const file = await aLongJpeg();
    const leaving = await signedIn({ personId: shop.desk.personId, freshAt: new Date() });
    // A session seen long ago is written when it is seen again: so the photo is past the door.
    await run('UPDATE sessions SET seen_at = ? WHERE person_id = ?', [
      new Date(Date.now() - 3_600_000),
      shop.desk.personId,
    ]);
    const { request, answered } = slowPut(file, leaving);
    request.write(file.subarray(0, 1_500_000));
    const seen = async () =>
      (
        await select(
          'SELECT 1 FROM sessions WHERE person_id = ? AND seen_at > NOW() - INTERVAL 30 MINUTE',
          [shop.desk.personId],
        )
      ).length === 1;
    await vi.waitUntil(seen, { timeout: 20_000, interval: 50 });
    await run('DELETE FROM sessions WHERE person_id = ?', [shop.desk.personId]);
    request.end(file.subarray(1_500_000));
    expect(await answered).toEqual({
      status: 401,
      body: {
        code: 'signed-out',
        sentence: 'You were signed out while the photo went up. Sign in and send it again.',
      },
    });
    expect(await whatIsKept()).toEqual(before);
  });

  it('a sender that goes away in the middle leaves nothing', async () => {
    const before = await whatIsKept();
    const file = await aLongJpeg();
    const photoId = v7();
    const desk = await signedIn({ personId: shop.desk.personId, freshAt: new Date() });
    const { request, answered } = slowPut(file, desk, photoId);
    answered.catch(() => undefined);
    request.on('error', () => undefined);
    await new Promise((sent) => request.write(file.subarray(0, 2_000_000), sent));
    request.destroy();
    // The same photo is sent again at once, as a phone does.
    expect((await put(desk, file, {}, photoId)).status).toBe(201);
    const oneMore = { photos: before.photos + 1, originals: before.originals + 1 };
    await vi.waitFor(async () => expect(await whatIsKept()).toEqual(oneMore), {
      timeout: 20_000,
      interval: 100,
    });
  });
});

describe('a form without the page’s program', () => {
  async function form(files: [name: string, type: string, bytes: Buffer][], back: string) {
    const body = new FormData();
    for (const [name, type, bytes] of files)
      body.append('photos', new File([new Uint8Array(bytes)], name, { type }));
    const address = `/api/cases/${repair.number}/photos/form?back=${encodeURIComponent(back)}`;
    return technician.send(address, { method: 'POST', body, headers: { Origin: app.url } });
  }

  it('takes many photos and leads back to the page', async () => {
    const before = await whatIsKept();
    const back = `/bench/cases/${repair.number}/add?step=what`;
    const files = [await aLongJpeg(), await aLongJpeg()];
    const answer = await form(
      files.map((file, index) => [`${index}.jpg`, 'image/jpeg', file]),
      back,
    );
    expect([answer.status, answer.headers.get('location')]).toEqual([303, back]);
    expect((await whatIsKept()).photos - before.photos).toBe(2);
  });

  it('says which did not go up and why, and leads nowhere else', async () => {
    const name = '<b>words</b>.jpg';
    const answer = await form(
      [
        [name, 'image/jpeg', Buffer.from('Dear shop')],
        ['good.jpg', 'image/jpeg', await aJpeg({ salt: (salt += 1) })],
        ['', 'application/octet-stream', Buffer.alloc(0)],
      ],
      'https://elsewhere.example/',
    );
    expect(answer.status).toBe(400);
    const page = await answer.text();
    expect(page).toContain('This file is not a photo the shop can read.');
    expect(page).not.toContain('<b>words</b>');
    expect(page).not.toContain('good.jpg');
    expect(page).toContain(`href="/bench/cases/${repair.number}"`);
  });
});
