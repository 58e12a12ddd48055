import { randomBytes } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { setFault } from '#local/faults.ts';
import { startSession } from '#server/auth/start-session.ts';
import { run, select } from '#server/db/sql.ts';
import { getStream } from '#server/storage/objects.ts';
import { useAppDatabase } from '#tests/access/app-database.ts';
import { aJpeg } from '#tests/photos/pictures.ts';
import { sha256Of } from '#tests/photos/sending.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { startApp } from '#tests/setup/app.ts';
import { openBrowser, phone } from '#tests/setup/browser.ts';

const app = await startApp({ ownStore: true });
useAppDatabase(app);
const browser = await openBrowser();

let shop: TestShop;
let repair: TestCase;
beforeAll(async () => {
  shop = await setUpShop();
});

interface ChosenFile {
  name: string;
  mimeType: string;
  buffer: Buffer;
}

let salt = 9000;
/** A photo of 1 MB that nobody has sent. */
async function aPhoto(name: string): Promise<ChosenFile> {
  const bytes = Buffer.concat([await aJpeg({ salt: (salt += 1) }), randomBytes(1_000_000)]);
  return { name, mimeType: 'image/jpeg', buffer: bytes };
}

async function signIn(page: Page): Promise<void> {
  const holder = { personId: shop.technician.personId, freshAt: new Date() };
  const set = await startSession(new Request(app.url), holder);
  const [name = '', value = ''] = (set.split(';')[0] ?? '').split(/=(.*)/);
  await page.context().addCookies([{ name, value, url: app.url }]);
}

/** The page where photos are added to a new entry of a new case, on a phone. */
async function addPage(options: Parameters<typeof browser.page>[0] = {}): Promise<Page> {
  repair = await takeInCase(shop);
  const page = await browser.page({ ...phone, ...options });
  await signIn(page);
  await page.goto(`${app.url}/bench/cases/${repair.number}/add`);
  // The button is there once the page’s program has come.
  if (options.javaScriptEnabled !== false)
    await page.getByRole('button', { name: 'Choose photos' }).waitFor();
  return page;
}

const choose = (page: Page, files: ChosenFile[] | string[]) =>
  page.locator('input[name=photos]').setInputFiles(files);

const row = (page: Page, name: string | RegExp) =>
  page.getByRole('region', { name: 'Photos going up' }).getByRole('listitem').filter({
    hasText: name,
  });

const originals = () =>
  select<{ sha256: Buffer; object_key: string; file_name: string; number: number; state: string }>(
    'SELECT * FROM photos WHERE case_id = ? ORDER BY number',
    [repair.id],
  );

async function expectSafe(files: ChosenFile[]): Promise<void> {
  const rows = await originals();
  const kept = await Promise.all(
    rows.map(async ({ object_key }) => {
      const stream = await getStream(object_key);
      return stream === undefined ? '' : sha256Of(await buffer(stream));
    }),
  );
  expect(kept.sort()).toEqual(files.map((file) => sha256Of(file.buffer)).sort());
}

describe('photos from the phone', () => {
  it('go up many at once, each with its progress; what is none says why', async () => {
    const page = await addPage({ expected: [/status of 400/] });
    const good = await Promise.all(['1', '2', '3', '4', '5'].map((n) => aPhoto(`bridge ${n}.jpg`)));
    const words = { name: 'words.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('Dear shop') };
    const cut = await aPhoto('cut.jpg');
    cut.buffer = cut.buffer.subarray(0, 500);
    await choose(page, [...good, words, cut]);
    await page.getByText('5 up, 2 did not go up.').waitFor({ timeout: 60_000 });
    expect(await row(page, 'words.jpg').innerText()).toContain(
      'This file is not a photo the shop can read. Send JPEG, PNG, WebP or HEIC.',
    );
    await row(page, 'This photo stops before its end.').waitFor();
    await expectSafe(good);

    // The same file chosen again is the same photo.
    await choose(page, good.slice(0, 1));
    await page.getByText('5 up, 2 did not go up.').waitFor();
    await expectSafe(good);
  });

  it('are kept while there is no network, and go up by themselves when it is back', async () => {
    const page = await addPage({ expected: [/ERR_INTERNET_DISCONNECTED/, /Failed to fetch/] });
    await page.context().setOffline(true);
    const files = [await aPhoto('top.jpg'), await aPhoto('back.jpg'), await aPhoto('side.jpg')];
    await choose(page, files);
    await row(page, 'top.jpg').getByText('No signal, kept').waitFor();
    expect(await originals()).toEqual([]);
    await page.context().setOffline(false);
    await page.getByText('All 3 are up.').waitFor({ timeout: 60_000 });
    await expectSafe(files);
  });

  it('go up once a store that refused takes them again', async () => {
    const page = await addPage({ expected: [/503/] });
    await setFault(app.storeUrl, { kind: 'refuse' });
    const file = await aPhoto('neck.jpg');
    await choose(page, [file]);
    await row(page, 'neck.jpg').getByText('Waiting').waitFor({ timeout: 60_000 });
    expect(await originals()).toEqual([]);
    await setFault(app.storeUrl, { kind: 'none' });
    await page.getByText('It is up.').waitFor({ timeout: 60_000 });
    await expectSafe([file]);
  });

  it('wait for the person who was signed out', async () => {
    const page = await addPage({ expected: [/401/] });
    await run('DELETE FROM sessions WHERE person_id = ?', [shop.technician.personId]);
    const file = await aPhoto('saddle.jpg');
    await choose(page, [file]);
    await row(page, 'You are signed out. Sign in and try again.').waitFor();
    await signIn(page);
    await row(page, 'saddle.jpg').getByRole('button', { name: 'Try again' }).click();
    await page.getByText('It is up.').waitFor({ timeout: 60_000 });
    await expectSafe([file]);
  });

  it('go up by a plain form where the page’s program does not come', async () => {
    const page = await addPage({ javaScriptEnabled: false });
    const files = [await aPhoto('one.jpg'), await aPhoto('two.jpg')];
    await choose(page, files);
    await page.getByRole('button', { name: 'Send the photos' }).click();
    await vi.waitFor(() => expectSafe(files), { timeout: 60_000, interval: 200 });
    await page.waitForURL(({ pathname }) => pathname === `/bench/cases/${repair.number}/add`);
  });

  it('belong to the entry they were added to', async () => {
    const page = await addPage({ viewport: { width: 1440, height: 900 }, isMobile: false });
    await choose(page, [await aPhoto('bridge.jpg')]);
    await page.getByText('It is up.').waitFor({ timeout: 60_000 });
    await page.getByLabel('Title').fill('Bridge off');
    await page.getByRole('textbox', { name: 'Photo 1' }).fill('Bridge from behind');
    await page.getByRole('button', { name: 'Add to timeline' }).click();
    await page.waitForURL(/added=/);
    const links = await select(
      `SELECT l.caption, f.file_name FROM entry_photos l JOIN photos f ON f.id = l.photo_id
       WHERE f.case_id = ?`,
      [repair.id],
    );
    expect(links).toEqual([{ caption: 'Bridge from behind', file_name: 'bridge.jpg' }]);
  });
});

const folder = process.env.WITNESSMARK_REAL_PHOTOS;
if (folder !== undefined) {
  describe('photographs of real cameras through the browser', () => {
    it('all go up or say why, and come back byte for byte', { timeout: 600_000 }, async () => {
      const page = await addPage();
      const names = readdirSync(folder).filter((name) => /\.(jpe?g|hei[cf])$/.test(name));
      await choose(
        page,
        names.map((name) => join(folder, name)),
      );
      await page.getByText(`All ${names.length} are up.`).waitFor({ timeout: 300_000 });
      const rows = await originals();
      for (const { file_name, sha256 } of rows)
        expect(sha256.toString('hex')).toBe(sha256Of(readFileSync(join(folder, file_name))));
      expect(rows).toHaveLength(names.length);
      console.log(rows.map(({ number, file_name }) => `Photo ${number}: ${file_name}`).join('\n'));
    });
  });
}
