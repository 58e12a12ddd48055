import { toInstant } from '#evidence/bytes/instant.ts';
import type { LogStartShown } from '#evidence/chain/log-shown.ts';
import { readLogState } from '../log-state.ts';
import type { Differences } from './differences.ts';

/** Holds the log's own row against the leaves: its name, its size, its last instant. */
export async function checkState(
  found: Differences,
  leaves: { size: number; lastRecordedAt: string; start: LogStartShown | undefined },
): Promise<void> {
  const { origin, size, lastRecordedAt } = await readLogState();
  const last = lastRecordedAt && toInstant(lastRecordedAt);
  found.expect(size === leaves.size, 'log_states.size', 'the log', `has ${leaves.size} leaves`);
  found.expect(
    last === leaves.lastRecordedAt,
    'log_states.last_recorded_at',
    'the log',
    'is not the last entry’s',
  );
  found.expect(
    origin === leaves.start?.origin,
    'log_states.origin',
    'the log',
    'is not the one it began with',
  );
}
