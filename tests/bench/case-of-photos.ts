import { select } from '#server/db/sql.ts';
import { runDueJobs } from '#server/jobs/run-due-jobs.ts';
import type { Cast } from '#seeds/demo-shop.ts';
import { Story } from '#seeds/story.ts';

const PICTURES = [
  'parlour-guitar/02-before-bridge-lifted-back-edge.jpg',
  'parlour-guitar/03-before-top-crack-raking-light.jpg',
  'parlour-guitar/04-during-bridge-off-crack-cleaned.jpg',
  'electric-bass/04-during-two-slots-routed.jpg',
  'mandolin/02-during-frets-pulled-top-taped.jpg',
];
const PER_ENTRY = 10;
const MINUTE = 60_000;

/** An owner's case with so many photos, all sealed and shared. */
export interface CaseOfPhotos {
  number: string;
  customerId: string;
}

/**
 * Makes a case with `count` photos through the operations: ten to an entry, each a file of its own (the
 * camera's clock differs), sealed for the owner. `at` must be later than anything sealed so far.
 */
export async function caseOfPhotos(
  { tomasz }: Cast,
  { count, at, email }: { count: number; at: Date; email: string },
): Promise<CaseOfPhotos> {
  const story = new Story().takenIn(
    at,
    tomasz,
    {
      owner: { name: 'Wilhelmina Ashgrove', email, tellBy: 'email' },
      instrument: { kind: 'Parlour guitar', maker: 'Aldous Pike' },
      job: 'Everything photographed',
      complaint: 'Show me all of it.',
      consentPhotos: 'on',
    },
    { phase: 'before', title: 'Taken in at the counter', text: 'Whole.' },
    { by: tomasz, minutesLater: 1 },
    at.getUTCFullYear(),
  );
  for (let done = 0; done < count; done += PER_ENTRY) {
    const when = new Date(at.getTime() + (2 + done) * MINUTE);
    const photos = Array.from({ length: Math.min(PER_ENTRY, count - done) }, (_, i) => ({
      file: PICTURES[(done + i) % PICTURES.length] ?? '',
      caption: `View ${done + i + 1}, as the work stood`,
      takenAt: new Date(when.getTime() + i * 1000),
    }));
    const text =
      'What was found and what was done, written as at the bench, in two lines or three.';
    const phase = done < count / 2 ? 'before' : 'during';
    story.entry(
      when,
      tomasz,
      { phase, title: `Step ${done / PER_ENTRY + 1}`, text, photos },
      { by: tomasz, minutesLater: 1 },
    );
  }
  for (const { run } of story.writing) await run();
  const lanes = [1, 2].map(() => runDueJobs({ kinds: ['derive-photo'] }));
  await Promise.all(lanes);
  for (const { run } of story.sealing) await run();
  const [owner] = await select<{ id: string }>('SELECT id FROM customers WHERE email = ?', [email]);
  if (!owner) throw new Error('The owner was not written down.');
  return { number: story.number, customerId: owner.id };
}
