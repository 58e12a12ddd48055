import { inject } from 'vitest';
import type { CaughtMail } from '#local/mail-page.ts';

/** All mails that were delivered to an address, oldest first. `mailUrl` is the shared catcher unless given. */
export async function mailsTo(
  address: string,
  { mailUrl = inject('services').mailUrl, count = 0, wait = 0 } = {},
): Promise<CaughtMail[]> {
  const query = new URLSearchParams({ to: address, count: String(count), wait: String(wait) });
  const response = await fetch(new URL(`/mails.json?${query}`, mailUrl));
  return (await response.json()) as CaughtMail[];
}

/** The newest mail to an address once `count` have come; throws when they have not within ten seconds. */
export async function waitForMail(
  address: string,
  { mailUrl = inject('services').mailUrl, count = 1 } = {},
): Promise<CaughtMail> {
  const mails = await mailsTo(address, { mailUrl, count, wait: 10_000 });
  const newest = mails.at(-1);
  if (!newest || mails.length < count)
    throw new Error(`${mails.length} of ${count} mails came to ${address} within ten seconds.`);
  return newest;
}
