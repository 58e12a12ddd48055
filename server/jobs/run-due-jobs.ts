import { claimJobs } from './claim-jobs.ts';
import { doJob } from './do-job.ts';
import { handlers } from './handlers.ts';

/**
 * Does every job that is due at `now`, one after another, until none is left: for seeds and tests,
 * which run without a worker. A job that fails waits for its next time. Returns the counts.
 */
export async function runDueJobs({
  now = new Date(),
  kinds = Object.keys(handlers),
} = {}): Promise<{ done: number; failed: number }> {
  const counts = { done: 0, failed: 0 };
  for (;;) {
    const [job] = await claimJobs(kinds, 1, { now });
    if (job === undefined) return counts;
    counts[(await doJob(job, { now })) ? 'done' : 'failed'] += 1;
  }
}
