import { pathToFileURL } from 'node:url';
import { Conflict, Invalid, Problem } from '#domain/errors.ts';
import { toInstant } from '#evidence/bytes/instant.ts';
import { closeDatabase } from '#server/db/connection.ts';
import { transaction } from '#server/db/sql.ts';
import { appendEntry } from './append-entry.ts';
import { lockHead } from './log-state.ts';
import { OWN_CHAIN } from './own-chain.ts';

/**
 * Writes into the log, open to all, that the clock was wrong and goes back now: the way out when
 * entries were sealed by a clock that ran ahead. Everyone who checks sees the old time, the new one
 * and the reason.
 * @throws Invalid without a reason; Conflict when the clock is not behind the last entry
 */
export async function recordClock(
  { reason }: { reason: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<void> {
  const text = reason.trim();
  if (text === '') throw new Invalid({ reason: 'Why was the clock wrong? Say it in a few words.' });
  await transaction(async (tx) => {
    const { lastRecordedAt: last } = await lockHead(tx);
    if (!last || now >= last) {
      throw new Conflict(
        'The clock is not behind the last sealed entry. Nothing is to be recorded.',
      );
    }
    await appendEntry(tx, {
      chain: OWN_CHAIN,
      kind: 'clock',
      visibility: 'shared',
      occurredAt: null,
      parts: { shown: { v: 1, old: toInstant(last), new: toInstant(now), reason: text } },
      photos: [],
      names: [],
      now,
    });
  });
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  try {
    await recordClock({ reason: process.argv.slice(2).join(' ') });
    process.stdout.write('The log says now that the clock was wrong. Sealing goes on.\n');
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    process.stderr.write(`${error.sentence}\n`);
    process.exitCode = 1;
  } finally {
    await closeDatabase();
  }
}
