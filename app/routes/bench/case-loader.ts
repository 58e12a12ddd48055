import { moneyOf } from '#app/lib/views/money-of.ts';
import { phasesView } from '#app/lib/views/phases-view.ts';
import { viewerPhotos } from '#app/lib/views/viewer-photos.ts';
import { may } from '#domain/rights.ts';
import type { TimelineEntry } from '#domain/timeline.ts';
import type { Viewer } from '#domain/viewer.ts';
import { getCase, type CaseFile } from '#server/cases/get-case.ts';
import { listTimeline } from '#server/entries/list-timeline.ts';
import { listTrouble } from '#server/jobs/list-trouble.ts';
import { listCasePhotos } from '#server/photos/list-case-photos.ts';
import { listPeople } from '#server/shop/list-people.ts';
import { readShop } from '#server/shop/read-shop.ts';
import type { CaseActsView } from './case-acts.tsx';
import { caseHeading, caseTagView, photosStatus, whatIsNextView } from './case-view.ts';
import type { EntryActsView } from './entry-actions.tsx';

const STORIES = ['entry', 'amendment', 'inspection', 'incident'];

function entryActs(viewer: Viewer, file: CaseFile, entry: TimelineEntry): EntryActsView {
  const own = viewer.kind === 'staff' && entry.writtenById === viewer.personId;
  const open = entry.seal === null;
  const changeable = open && (!file.closedAt || entry.kind === 'amendment');
  return {
    benchNote: entry.benchNote,
    writtenBy: open ? entry.writtenBy : null,
    mayEdit: changeable && (own || may(viewer, 'add entry')),
    maySeal: changeable && may(viewer, 'seal', { own }),
    mayCorrect:
      !open && STORIES.includes(entry.kind) && !entry.corrects && may(viewer, 'amend', { own }),
  };
}

function caseActs(
  viewer: Viewer,
  file: CaseFile,
  { people, currency }: Pick<CaseActsView, 'people'> & { currency: string },
): CaseActsView {
  const open = !file.closedAt;
  const { estimate, nextStep, technicianId, place } = file;
  const waiting = open && estimate?.answer === null ? estimate : null;
  return {
    people,
    next: open
      ? { nextStep: nextStep ?? '', technicianId: technicianId ?? '', place: place ?? '' }
      : null,
    estimate: open && may(viewer, 'write estimate') ? { currency } : null,
    answer:
      waiting && may(viewer, 'record authorisation')
        ? {
            revision: waiting.revision,
            summary: waiting.summary,
            total: moneyOf(waiting),
          }
        : null,
    proof: open ? file.onHold : null,
  };
}

/** Everything the case file shows; the photos in full only when one is asked for. */
export async function loadCase(viewer: Viewer, number: string, photo: string | null, now: Date) {
  const [file, timeline, shop, people, trouble, photos] = await Promise.all([
    getCase(viewer, { number }, { now }),
    listTimeline(viewer, { caseNumber: number }),
    readShop(),
    listPeople(viewer),
    listTrouble(viewer, { number }),
    photo === null ? null : listCasePhotos(viewer, { caseNumber: number }),
  ]);
  const sight = { now, zone: shop.timeZone, photoHref: (n: number) => `?photo=${n}` };
  const bench = people.filter(({ role }) => role !== 'desk');
  const benchPeople = bench.map(({ id, name }) => ({ value: id, label: name }));
  return {
    number,
    version: file.version,
    heading: caseHeading(file),
    tag: caseTagView(file, sight),
    next: whatIsNextView(file, timeline, sight),
    phases: phasesView(timeline, sight),
    count: timeline.length,
    status: photosStatus(timeline),
    trouble: trouble.map(({ sentence }) => sentence),
    isOpen: !file.closedAt,
    isHere: !file.handedBackAt,
    latest: timeline.at(-1)?.id ?? null,
    acts: caseActs(viewer, file, { people: benchPeople, currency: shop.currency }),
    entryActs: Object.fromEntries(
      timeline.map((entry) => [entry.id, entryActs(viewer, file, entry)]),
    ),
    viewer: photos && viewerPhotos(timeline, photos, sight),
  };
}
