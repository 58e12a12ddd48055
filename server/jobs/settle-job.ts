import { Problem } from '#domain/errors.ts';
import { Outbox } from '../db/models/outbox.ts';
import { backOff, MOST_ATTEMPTS } from './back-off.ts';
import { GiveUp, type Job } from './job.ts';

const CODE = /^[\w-]{1,60}$/;

// Only a code is kept: messages of outside services repeat addresses.
function codeOf(error: unknown): string {
  if (error instanceof GiveUp || error instanceof Problem) return error.code;
  const { code, name } = error as { code?: unknown; name?: unknown };
  const found = [code, name].find((one) => typeof one === 'string' && CODE.test(one));
  return (found as string | undefined) ?? 'unknown';
}

/** Marks a job done. Its payload may hold an address or a code, and nobody needs it any more. */
export async function settleDone({ id }: Job, { now = new Date() } = {}): Promise<void> {
  await Outbox.update(
    { doneAt: now, claimedUntil: null, lastError: null, payload: '{}' },
    { where: { id } },
  );
}

/** Puts a job that failed back for later, or gives it up. Returns whether it was given up. */
export async function settleFailed(
  { id, attempts }: Job,
  error: unknown,
  { now = new Date() } = {},
): Promise<boolean> {
  const over = error instanceof GiveUp || attempts >= MOST_ATTEMPTS;
  await Outbox.update(
    {
      claimedUntil: null,
      lastError: codeOf(error),
      failedAt: over ? now : null,
      dueAt: new Date(now.getTime() + backOff(attempts)),
    },
    { where: { id } },
  );
  return over;
}
