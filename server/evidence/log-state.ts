import { select, type Transaction } from '#server/db/sql.ts';

/** Where the witness log stands: its name, how many entries it has, when the last was recorded. */
export interface LogState {
  origin: string;
  size: number;
  lastRecordedAt: Date | null;
}

interface Row {
  origin: string;
  size: string;
  last_recorded_at: Date | null;
}

const READ = 'SELECT origin, size, last_recorded_at FROM log_states WHERE id = 1';

const NOT_OPEN = 'The witness log was never opened. Start the server once, or load the seeds.';

function logState(rows: Row[]): LogState {
  const [row] = rows;
  if (!row) throw new Error(NOT_OPEN);
  return {
    origin: row.origin,
    size: Number(row.size),
    lastRecordedAt: row.last_recorded_at,
  };
}

/** Reads the state as it was last committed. */
export async function readLogState(tx?: Transaction): Promise<LogState> {
  return logState(await select<Row>(READ, [], tx));
}

/**
 * Takes the head lock: until the transaction ends nobody else appends. Lock a case's row before
 * this, never after it, so that no two appends wait for one another.
 */
export async function lockHead(tx: Transaction): Promise<LogState> {
  return logState(await select<Row>(`${READ} FOR UPDATE`, [], tx));
}
