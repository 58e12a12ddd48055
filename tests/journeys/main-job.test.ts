import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { expect, test } from 'vitest';
import { startApp } from '#tests/setup/app.ts';
import { desktop, openBrowser, phone } from '#tests/setup/browser.ts';
import { expectAccessible } from './expect-accessible.ts';
import { signInAsOwner, signInAsStaff } from './people.ts';

const app = await startApp({ seeded: true });
const browser = await openBrowser();
const pictures = join(import.meta.dirname, '../../seeds/pictures/parlour-guitar');

async function takeIn(page: Page, email: string): Promise<string> {
  await page.getByRole('link', { name: 'Take in an instrument' }).click();
  await page.getByRole('heading', { name: 'Take in an instrument' }).waitFor();
  await page.getByLabel('Name', { exact: true }).first().fill('Edda Vance');
  await page.getByLabel('E-mail address', { exact: true }).first().fill(email);
  await page.getByLabel('Kind').selectOption('Parlour guitar');
  await page.getByLabel('Maker').fill('Aldous Pike');
  await page.getByLabel('In a few words').fill('Lifted bridge');
  await page.getByLabel('The complaint').fill('The bridge comes up at the back.');
  await page.getByLabel('Photographs may be taken').check();
  await page.getByLabel('Verify may show picture and work').check();
  await expectAccessible(page, 'take in');
  await page.getByRole('button', { name: 'Take it in' }).click();
  await page.waitForURL(/\/bench\/cases\/\d{4}-\d{3}/);
  const number = /\d{4}-\d{3}/.exec(page.url())?.[0];
  if (number === undefined) throw new Error('The case has no number.');
  return number;
}

async function photograph(page: Page, number: string, onPhone: boolean): Promise<void> {
  await page.goto(`${app.url}/bench/cases/${number}/add`, { waitUntil: 'networkidle' });
  await page
    .locator('input[type=file]')
    .first()
    .setInputFiles([
      join(pictures, '02-before-bridge-lifted-back-edge.jpg'),
      join(pictures, '03-before-top-crack-raking-light.jpg'),
    ]);
  await page.getByText('All 2 are up.').waitFor();
  if (onPhone) await page.getByRole('link', { name: 'What it shows' }).click();
  await page.getByText('During', { exact: true }).click();
  await page.getByLabel('Title').fill('Damage looked over');
  await page.getByLabel('Note', { exact: true }).fill('A 0.6 mm feeler enters at the back edge.');
  await expectAccessible(page, 'add to timeline');
  await page.getByRole('button', { name: 'Add to timeline' }).click();
  await page.getByRole('heading', { name: 'Damage looked over' }).waitFor();
}

/** Seals every draft of the case, oldest first; a photo that is still being prepared is waited for. */
async function sealAll(page: Page, number: string): Promise<void> {
  const here = new RegExp(`/bench/cases/${number}(?:[?#].*)?$`);
  for (;;) {
    await page.goto(`${app.url}/bench/cases/${number}`);
    const open = page.locator('main').getByRole('link', { name: 'Seal it' });
    if ((await open.count()) === 0) return;
    // Followed by its address: an open case scrolls to its latest entry while it comes to life.
    await page.goto(new URL((await open.first().getAttribute('href')) ?? '', app.url).href);
    await page.getByRole('button', { name: 'Seal it' }).click();
    await Promise.race([page.waitForURL(here), page.getByRole('alert').waitFor()]);
  }
}

async function followAsOwner(page: Page, number: string): Promise<void> {
  await expectAccessible(page, 'my instruments');
  await page.goto(`${app.url}/portal/cases/${number}`);
  await page.getByText('On the bench').first().waitFor();
  await expectAccessible(page, 'portal, now');
  await page.goto(`${app.url}/portal/cases/${number}/timeline`);
  await page.getByRole('heading', { name: 'Damage looked over' }).waitFor();
  expect(await page.locator('main img').count()).toBeGreaterThanOrEqual(2);
  await expectAccessible(page, 'portal, timeline');
}

async function closeAndIssue(page: Page, number: string): Promise<string> {
  await page.goto(`${app.url}/bench/cases/${number}/close`);
  await expectAccessible(page, 'close');
  await page.getByRole('button', { name: 'Close the case' }).click();
  await page.waitForURL(/\/warranty$/);
  await expectAccessible(page, 'warranty');
  await page.getByRole('button', { name: 'Issue the warranty' }).click();
  await page.getByRole('link', { name: 'Open the PDF' }).waitFor({ timeout: 90_000 });
  const check = await page
    .getByRole('link', { name: 'Check it as a stranger would' })
    .getAttribute('href');
  if (check === null) throw new Error('There is no link to Verify.');
  return check;
}

async function verifyAsStranger(page: Page, check: string): Promise<void> {
  await page.goto(new URL(check, app.url).href);
  await page.getByText('Not fully checked').or(page.getByText('Intact')).first().waitFor();
  await page.getByText('In force').waitFor();
  await expectAccessible(page, 'verify');
  expect(await page.locator('body').innerText()).not.toContain('Vance');
}

// Some ten pages looked at by axe, each in the light and in the dark: minutes on a busy machine.
test.for([
  { screen: 'phone', options: phone, email: 'edda.phone@vance.example' },
  { screen: 'desktop', options: desktop, email: 'edda.desk@vance.example' },
])(
  'take in, photograph, seal, follow, close, issue, verify: $screen',
  { timeout: 300_000 },
  async (on) => {
    // A photo that is still being prepared is answered with 409, and asked again.
    const bench = await browser.page({ ...on.options, expected: [/status of 409/] });
    await signInAsStaff(bench, app, 'Tomasz Rell');
    await expectAccessible(bench, 'Rack');
    const number = await takeIn(bench, on.email);
    await photograph(bench, number, on.screen === 'phone');
    await sealAll(bench, number);
    await expectAccessible(bench, 'case file');

    const owner = await browser.page(on.options);
    // The receipt, two entries shared, and the code.
    await signInAsOwner(owner, app, { email: on.email, mails: 4 });
    await followAsOwner(owner, number);

    const check = await closeAndIssue(bench, number);
    await verifyAsStranger(await browser.page(on.options), check);
  },
);
