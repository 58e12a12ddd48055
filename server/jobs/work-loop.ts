import { log } from '../log.ts';
import { claimJobs } from './claim-jobs.ts';
import { doJob } from './do-job.ts';
import { handlers } from './handlers.ts';

/** How many jobs of a kind one worker does at the same time. Everything else: one. */
const AT_ONCE: Record<string, number> = { mail: 4, 'derive-photo': 2 };

const POLL_MS = 500;
/** The longest pause while the database does not answer. */
const TROUBLE_MS = 10_000;

/** Claims and does jobs until `stop` is called; `stop` resolves when the last one is settled. */
export function startWork(): { stop: () => Promise<void> } {
  const running = new Map<string, Set<Promise<unknown>>>();
  let stopping = false;
  let rest: ReturnType<typeof setTimeout> | undefined;
  let wake: (() => void) | undefined;

  const pause = (ms: number) =>
    new Promise<void>((resolve) => {
      wake = resolve;
      rest = setTimeout(resolve, ms);
    });

  async function round(): Promise<void> {
    for (const kind of Object.keys(handlers)) {
      const busy = running.get(kind) ?? new Set();
      running.set(kind, busy);
      for (const job of await claimJobs([kind], (AT_ONCE[kind] ?? 1) - busy.size)) {
        const doing = doJob(job)
          .catch((error: unknown) =>
            log.error({ err: error, job: job.id }, 'a job was not settled'),
          )
          .finally(() => {
            busy.delete(doing);
            // A full queue should not wait for the next poll.
            wake?.();
          });
        busy.add(doing);
      }
    }
  }

  async function loop(): Promise<void> {
    let failed = 0;
    while (!stopping) {
      const asleep = pause(Math.min(POLL_MS * 2 ** failed, TROUBLE_MS));
      try {
        await round();
        failed = 0;
      } catch (error) {
        // Said once: a database that is gone for an hour would fill the log.
        if (failed === 0) log.warn({ err: error }, 'no jobs can be claimed');
        failed += 1;
      }
      await asleep;
    }
    await Promise.all([...running.values()].flatMap((busy) => [...busy]));
  }

  const ended = loop();
  return {
    stop: () => {
      stopping = true;
      clearTimeout(rest);
      wake?.();
      return ended;
    },
  };
}
