import { v7 } from 'uuid';
import { EntryDraftSchema } from '#domain/entry-draft.ts';
import type { TakeIn } from '#domain/intake.ts';
import type { StaffViewer } from '#domain/viewer.ts';
import type { Transaction } from '#server/db/sql.ts';
import { writeDraft } from './write-draft.ts';

const sentence = (text: string) => (/[.!?…]$/.test(text) ? text : `${text}.`);

/**
 * Begins a case's timeline with what the counter knows, as a draft for whoever takes the first photos.
 * The complaint in the owner's own words stays out of it: it may be personal, and has a part of its
 * own that can be erased. Returns the entry's id.
 */
export async function startTimeline(
  tx: Transaction,
  {
    viewer,
    caseId,
    takeIn,
    now,
  }: { viewer: StaffViewer; caseId: string; takeIn: TakeIn; now: Date },
): Promise<string> {
  const came = takeIn.accessories === '' ? [] : [sentence(`Came with it: ${takeIn.accessories}`)];
  const consent = takeIn.consentPhotos
    ? 'The owner agreed to photographs.'
    : 'The owner did not agree to photographs.';
  const publish = takeIn.publishWork
    ? 'Verify may show picture and work.'
    : 'Verify may show number and standing only.';
  const draft = EntryDraftSchema.parse({
    title: 'Taken in at the counter',
    text: [sentence(takeIn.job), ...came].join(' '),
    benchNote: `${consent} ${publish}`,
  });
  const id = v7();
  await writeDraft(tx, {
    id,
    caseId,
    phase: 'before',
    visibility: 'shared',
    draft,
    photos: [],
    takeOff: [],
    writer: viewer,
    occurredAt: null,
    now,
  });
  return id;
}
