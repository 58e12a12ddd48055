import { RateLimiterRes, type RateLimiterStoreAbstract } from 'rate-limiter-flexible';
import { TooMany } from '#domain/errors.ts';
import { DatabaseLimiter } from './rate-limiter.ts';

const MINUTE = 60;

const limit = (keyPrefix: string, points: number, duration: number) => {
  let held: RateLimiterStoreAbstract | undefined;
  return () => (held ??= new DatabaseLimiter({ keyPrefix, points, duration }));
};

// Figures from memory of common practice: room for a family behind one address, none for guessing.
const askedByAddress = limit('code-to', 5, 15 * MINUTE);
const askedByIp = limit('code-from', 30, 60 * MINUTE);
const triedByIp = limit('try-from', 60, 60 * MINUTE);

async function consume(
  limiter: RateLimiterStoreAbstract,
  key: string,
  what: string,
): Promise<void> {
  try {
    await limiter.consume(key);
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const seconds = Math.ceil(error.msBeforeNext / 1000);
    const minutes = Math.max(Math.ceil(seconds / MINUTE), 1);
    const wait = minutes === 1 ? 'a minute' : `${minutes} minutes`;
    throw new TooMany(`${what} Wait ${wait} and try again.`, seconds);
  }
}

/** Counts a wish for a code; throws TooMany, for known and unknown addresses alike. */
export async function countAsking(email: string, ip: string): Promise<void> {
  await consume(askedByIp(), ip, 'Too many codes were asked for from here.');
  await consume(askedByAddress(), email, 'Too many codes were asked for.');
}

/** Counts a try of a code; throws TooMany. */
export async function countTry(ip: string): Promise<void> {
  await consume(triedByIp(), ip, 'Too many codes were tried from here.');
}
