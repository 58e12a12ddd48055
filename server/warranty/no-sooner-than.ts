import { setTimeout as wait } from 'node:timers/promises';

/**
 * The result of `work`, given no sooner than `ms` from now: whoever asks learns nothing from how
 * quickly a short answer came.
 */
export async function noSoonerThan<T>(ms: number, work: Promise<T>): Promise<T> {
  const [result] = await Promise.all([work, wait(ms)]);
  return result;
}
