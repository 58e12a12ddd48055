import { expect, it } from 'vitest';
import { setFault } from '#local/faults.ts';
import { startApp } from './app.ts';
import { desktop, openBrowser } from './browser.ts';

const app = await startApp({ ownStore: true });
const browser = await openBrowser();

it('serves the built program with an identity provider that lets staff choose who they are', async () => {
  const page = await browser.page(desktop);
  await page.goto(`${app.url}/sign-in`);
  const answer = await page.goto(`${app.url}/sign-in/staff`);
  expect(answer?.url()).toContain(app.identity.issuer);
  expect(await page.getByRole('button', { name: 'Tomasz Rell, technician' }).count()).toBe(1);
});

it('comes back after a crash', async () => {
  await app.crashAndRestart();
  expect((await fetch(`${app.url}/api/health`)).status).toBe(200);
});

it('has a store of its own that can be made to refuse', async () => {
  await setFault(app.storeUrl, { kind: 'refuse' });
  expect((await fetch(app.storeUrl)).status).toBe(503);
  await setFault(app.storeUrl, { kind: 'none' });
  expect((await fetch(app.storeUrl)).status).toBe(403);
});
