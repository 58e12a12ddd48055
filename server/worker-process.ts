import { fork, type ChildProcess } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { log } from './log.ts';

const WORKER = fileURLToPath(new URL('./jobs/worker.ts', import.meta.url));
const LONGEST_WAIT_MS = 30_000;
const LIVED_LONG_MS = 60_000;

/**
 * Keeps one worker process alive: starts it anew when it dies, later each time it dies young.
 * `stop` asks it to finish what it does and kills it after `capMs`.
 */
export function keepWorker(): {
  stop: (capMs: number) => Promise<void>;
  /** The process id of the one that runs now. */
  pid: () => number | undefined;
} {
  let child: ChildProcess | undefined;
  let again: ReturnType<typeof setTimeout> | undefined;
  let stopping = false;
  let wait = 500;

  const start = () => {
    const born = Date.now();
    child = fork(WORKER, { execArgv: ['--import', 'tsx'] });
    child.once('exit', (code, signal) => {
      child = undefined;
      if (stopping) return;
      wait = Date.now() - born > LIVED_LONG_MS ? 500 : Math.min(wait * 2, LONGEST_WAIT_MS);
      log.warn({ exit: code, signal, wait }, 'the worker died and is started again');
      again = setTimeout(start, wait);
    });
  };
  start();

  return {
    pid: () => child?.pid,
    stop: async (capMs) => {
      stopping = true;
      clearTimeout(again);
      const last = child;
      if (last === undefined) return;
      const gone = new Promise<void>((resolve) => last.once('exit', () => resolve()));
      last.kill('SIGTERM');
      const cap = setTimeout(() => last.kill('SIGKILL'), capMs);
      await gone;
      clearTimeout(cap);
    },
  };
}
