import { Temporal } from 'temporal-polyfill';
import { closeDatabase, database } from '#server/db/connection.ts';
import { migrator } from '#server/db/migrate.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import { demoClock } from './demo-clock.ts';
import { DEMO_ZONE, openDemoShop } from './demo-shop.ts';
import type { Step, Story } from './story.ts';
import { electricBass } from './stories/electric-bass.ts';
import { handedBack } from './stories/handed-back.ts';
import { mandolin } from './stories/mandolin.ts';
import { atWork, readyToGoHome, waiting } from './stories/others.ts';
import { parlourGuitar } from './stories/parlour-guitar.ts';

const LOADED = 'loaded the demo';
/** Numbers before this one belong to the shop's paper cards. */
const LAST_PAPER_NUMBER = 24;
const ROUNDS = 5;
const LONGEST_WAIT_MS = 3_600_000;

async function inOrder(steps: Step[]): Promise<void> {
  const sorted = [...steps].sort((a, b) => a.at.getTime() - b.at.getTime());
  for (const { run: tell } of sorted) await tell();
}

async function isLoaded(): Promise<boolean> {
  const rows = await select('SELECT id FROM audit_records WHERE act = ? LIMIT 1', [LOADED]);
  return rows.length > 0;
}

/** An attempt that was cut short is cleared away: nobody has used what it left. */
async function clearAttempt(): Promise<void> {
  const [shop] = await select<{ email: string }>('SELECT email FROM shops');
  if (!shop) return;
  if (shop.email !== 'bench@wrenfield.example')
    throw new Error(
      'This database holds another shop. The demo is loaded into an empty database only; set DATABASE_URL to one.',
    );
  const migrations = migrator(database());
  await migrations.down({ to: 0 });
  await migrations.up();
}

/** Two pictures at a time. What failed on a busy machine is due again later; a few rounds are enough. */
async function makePhotosReady(now: Date): Promise<void> {
  for (let round = 0; round < ROUNDS; round += 1) {
    const due = new Date(now.getTime() + round * LONGEST_WAIT_MS);
    const lanes = [1, 2].map(() => runDueJobs({ kinds: ['derive-photo'], now: due }));
    const failed = (await Promise.all(lanes)).reduce((sum, lane) => sum + lane.failed, 0);
    if (failed === 0) return;
  }
  throw new Error('The pictures of the demo could not be made ready. Run npm start again.');
}

/**
 * Loads the demo shop into an empty database: three repairs at three different points, and enough
 * others to fill the Rack, all of it counted back from `now`. A second call changes nothing; one that
 * was cut short is begun anew. Throws Error with a sentence when the database holds another shop.
 */
export async function loadDemo(now = new Date()): Promise<void> {
  if (await isLoaded()) return;
  await clearAttempt();
  const clock = demoClock(now, DEMO_ZONE);
  const opened = clock.workday(40, '09:00');
  const cast = await openDemoShop(opened);
  await openLog({ now: opened });
  const series = Temporal.Instant.fromEpochMilliseconds(now.getTime()).toZonedDateTimeISO(
    DEMO_ZONE,
  ).year;
  await run('INSERT INTO case_years (year, last_ordinal) VALUES (?, ?)', [
    series,
    LAST_PAPER_NUMBER,
  ]);
  const stories: Story[] = [
    parlourGuitar(clock, cast, series),
    electricBass(clock, cast, series),
    mandolin(clock, cast, series),
    ...atWork(clock, cast, series),
    ...waiting(clock, cast, series),
    ...readyToGoHome(clock, cast, series),
    ...handedBack(clock, cast, series),
  ];
  await inOrder(stories.flatMap(({ writing }) => writing));
  await makePhotosReady(now);
  await inOrder(stories.flatMap(({ sealing }) => sealing));
  await transaction(async (tx) => {
    // What was told before the demo began is not told again.
    await run("DELETE FROM outbox WHERE kind = 'mail'", [], tx);
    await recordAct(tx, cast.ines, { act: LOADED }, { now });
  });
  // From here on the worker would go on by itself; doing it now has the warranty ready at first sight.
  await runDueJobs({ kinds: ['sign-head', 'issue-warranty'] });
}

/** As `loadDemo`, and closes the connection: for the command. */
export async function loadDemoOnce(): Promise<void> {
  try {
    await loadDemo();
  } finally {
    await closeDatabase();
  }
}
