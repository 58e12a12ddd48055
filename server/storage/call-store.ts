import { S3ServiceException } from '@aws-sdk/client-s3';
import { Unavailable } from '#domain/errors.ts';
import { log } from '#server/log.ts';

/** How long the store may stay silent, in ms, before it counts as gone. */
export const PATIENCE = 15_000;

const statusOf = (error: unknown) =>
  error instanceof S3ServiceException ? error.$metadata.httpStatusCode : undefined;

/** What the caller is to see of an error of the store: the sentence for people, with the cause in the log. */
export function storeProblem(error: unknown): Unavailable {
  const { name } = error as Error;
  log.warn({ fault: name, status: statusOf(error) }, 'the object store failed');
  return new Unavailable('store');
}

/**
 * Makes one short call to the store: an answer within `patience` ms, `undefined` when what was
 * asked for is not there, and Unavailable for everything else (silent, refusing, gone).
 */
export async function callStore<Answer>(
  call: (abortSignal: AbortSignal) => Promise<Answer>,
  patience = PATIENCE,
): Promise<Answer | undefined> {
  const stop = new AbortController();
  const timer = setTimeout(() => stop.abort(), patience);
  try {
    return await call(stop.signal);
  } catch (error) {
    if (statusOf(error) === 404) return undefined;
    throw storeProblem(error);
  } finally {
    // Not AbortSignal.timeout: it would also cut a body that is still being read after the answer.
    clearTimeout(timer);
  }
}
