import { log } from '../log.ts';
import { CLAIM_MS, renewClaim } from './claim-jobs.ts';
import { handlers } from './handlers.ts';
import { GiveUp, type Handler, type Job } from './job.ts';
import { settleDone, settleFailed } from './settle-job.ts';

/** Does a claimed job and settles it. Never throws for the job's own failure. Returns whether it was done. */
export async function doJob(
  job: Job,
  { now, handler = handlers[job.kind] }: { now?: Date; handler?: Handler | undefined } = {},
): Promise<boolean> {
  const at = now === undefined ? {} : { now };
  const renewing = setInterval(() => {
    renewClaim(job.id).catch((error: unknown) =>
      log.warn({ err: error }, 'a claim was not renewed'),
    );
  }, CLAIM_MS / 3);
  try {
    if (handler === undefined) throw new GiveUp('no-handler');
    await handler(job.payload);
  } catch (error) {
    const over = await settleFailed(job, error, at);
    const { id, kind, attempts } = job;
    log[over ? 'error' : 'warn']({ job: id, kind, attempts, err: error }, 'a job failed');
    return false;
  } finally {
    clearInterval(renewing);
  }
  await settleDone(job, at);
  return true;
}
