import { setPriority } from 'node:os';
import { sweepExpired } from '../auth/sweep-expired.ts';
import { closeDatabase } from '../db/connection.ts';
import { log } from '../log.ts';
import { sweepObjects } from '../photos/sweep-objects.ts';
import { startWork } from './work-loop.ts';

// The worker process: does the outbox's jobs after the web tier's own work, in priority and in time.
const HOUR_MS = 60 * 60 * 1000;

setPriority(10);

const sweep = () => {
  for (const one of [sweepExpired, sweepObjects])
    one().catch((error: unknown) => log.warn({ err: error }, 'nothing was swept'));
};
const sweeping = setInterval(sweep, HOUR_MS);
sweep();

const work = startWork();
log.info('the worker is at work');

async function stop(): Promise<void> {
  clearInterval(sweeping);
  await work.stop();
  await closeDatabase();
  process.exit(0);
}

process.once('SIGTERM', () => void stop());
process.once('SIGINT', () => void stop());
// The server holds the other end: when it is gone, however it went, so is the worker.
process.once('disconnect', () => void stop());
