import type { EntryInput } from '#domain/entry-draft.ts';
import { NotAllowed } from '#domain/errors.ts';
import { demand, may } from '#domain/rights.ts';
import { staffOnly } from '#server/record/lock-case.ts';
import type { StaffViewer, Viewer } from '#domain/viewer.ts';

const DESK =
  'The front desk adds photos and notes. Leave rest, materials, climate and hours to the bench.';

/**
 * The viewer as somebody who may write this entry: the bench anything, the front desk photos and
 * notes. Throws NotAllowed otherwise.
 */
export function demandEntry(viewer: Viewer, { draft }: EntryInput): StaffViewer {
  demand(viewer, 'add photos and notes');
  const staff = staffOnly(viewer);
  const benchWork =
    draft.rest ?? draft.temperature ?? draft.humidity ?? draft.minutes ?? draft.used[0] ?? null;
  if (benchWork !== null && !may(viewer, 'add entry')) throw new NotAllowed(DESK);
  return staff;
}
