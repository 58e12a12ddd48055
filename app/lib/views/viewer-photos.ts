import type { TimelineEntry, TimelinePhoto } from '#domain/timeline.ts';
import type { ViewerPhotoView } from '#app/ui/types.ts';
import { dayTime } from '../format/date.ts';
import type { Sight } from './entry-view.ts';
import { photoView } from './photo-view.ts';

/** What is known of a photo beside what its entry says. */
export interface PhotoFacts {
  id: string;
  /** Of the original, hex; null for a customer. */
  sha256: string | null;
  takenAt: Date | null;
  takenClock: string | null;
  receivedAt: Date;
  addedBy: string | null;
}

/** "2026-04-15 09:44", as the camera's clock gave it. */
function takenWords({ takenAt, takenClock, receivedAt }: PhotoFacts, zone: string): string {
  if (takenAt) return dayTime(takenAt, zone);
  if (takenClock)
    return `${takenClock.slice(0, 16).replace('T', ' ')} by the camera’s clock, time zone unknown`;
  return `added ${dayTime(receivedAt, zone)}`;
}

function sealWords(entry: TimelineEntry, zone: string): ViewerPhotoView['seal'] {
  if (entry.seal === null) return { state: 'open', lead: 'Not yet sealed.' };
  const by = entry.seal.by === null ? '' : `, by ${entry.seal.by}`;
  return { state: 'sealed', lead: `Sealed ${dayTime(entry.seal.at, zone)}${by}.` };
}

/** The photos of a timeline for the viewer, by phase; each once, under the entry it came in with. */
export function viewerPhotos(
  entries: TimelineEntry[],
  facts: PhotoFacts[],
  { zone }: Sight,
): ViewerPhotoView[] {
  const known = new Map(facts.map((fact) => [fact.id, fact]));
  const seen = new Set<string>();
  const once = ({ id, state }: TimelinePhoto) => {
    if (state !== 'ready' || seen.has(id)) return false;
    seen.add(id);
    return true;
  };
  return entries.flatMap((entry) =>
    entry.photos.filter(once).map((photo) => {
      const fact = known.get(photo.id);
      return {
        ...photoView(photo),
        phase: entry.phase,
        when: fact ? takenWords(fact, zone) : dayTime(entry.writtenAt, zone),
        takenBy: fact?.addedBy ?? undefined,
        sha256: fact?.sha256 ?? undefined,
        seal: sealWords(entry, zone),
      };
    }),
  );
}
