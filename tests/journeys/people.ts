import type { Page } from 'playwright-core';
import type { App } from '#tests/setup/app.ts';
import { waitForMail } from '#tests/setup/mail.ts';

/** Signs a person of the shop in, by the identity provider's own page, and waits for the Rack. */
export async function signInAsStaff(page: Page, app: App, name: string): Promise<void> {
  await page.goto(`${app.url}/sign-in`);
  await page.getByRole('link', { name: 'Staff: sign in' }).click();
  await page.getByRole('button', { name }).click();
  await page.getByRole('heading', { name: 'Rack', level: 1 }).waitFor();
}

/** Signs an owner in with the code from their mail, which must be the `mails`th they got. */
export async function signInAsOwner(
  page: Page,
  app: App,
  { email, mails }: { email: string; mails: number },
): Promise<void> {
  await page.goto(`${app.url}/sign-in`);
  await page.getByLabel('your e-mail address').fill(email);
  await page.getByRole('button', { name: 'Send a code' }).click();
  await page.getByRole('heading', { name: 'Enter the code' }).waitFor();
  const { text } = await waitForMail(email, { mailUrl: app.mail.pageUrl, count: mails });
  const code = /\b\d{3} ?\d{3}\b/.exec(text)?.[0] ?? '';
  await page.getByLabel('Six-digit code').fill(code);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.getByRole('heading', { name: 'My instruments' }).waitFor();
}
