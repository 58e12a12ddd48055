import { RateLimiterRes } from 'rate-limiter-flexible';
import { TooMany } from '#domain/errors.ts';
import { DatabaseLimiter } from '#server/auth/rate-limiter.ts';

// From memory of common practice: enough for an office that checks a drawer of papers, far too few to
// find one of 2^50 numbers.
const POINTS = 120;
const SECONDS = 600;

let held: DatabaseLimiter | undefined;

/** Counts a question about a number from an address. @throws TooMany */
export async function countNumber(ip: string): Promise<void> {
  held ??= new DatabaseLimiter({ keyPrefix: 'number-from', points: POINTS, duration: SECONDS });
  try {
    await held.consume(ip);
  } catch (error) {
    if (!(error instanceof RateLimiterRes)) throw error;
    const seconds = Math.ceil(error.msBeforeNext / 1000);
    throw new TooMany(
      `Too many numbers were asked for from here. Wait ${Math.max(1, Math.ceil(seconds / 60))} minutes, then try again.`,
      seconds,
    );
  }
}
