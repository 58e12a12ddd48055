import { mediaPath } from '#app/lib/views/photo-view.ts';
import type { GoingUpView } from '#app/ui/types.ts';
import type { TimelineEntry } from '#domain/timeline.ts';
import type { Viewer } from '#domain/viewer.ts';
import type { CasePhoto } from '#server/photos/list-case-photos.ts';

/** A photo that an entry's form names: up, or on its way. */
export interface NamedPhoto {
  id: string;
  /** "Photo 13", or the file's name. */
  name: string;
  thumb: string | null;
  caption: string;
  bench: boolean;
  /** Words of the tick box that leaves it out; null where it cannot be left out. */
  leaveOut: string | null;
}

/** Its sizes are made after it is up: until then there is no small picture. */
const thumbPath = ({ id, state }: Pick<CasePhoto, 'id' | 'state'>) =>
  state === 'ready' ? mediaPath(id, 320) : null;

/** Photos of the viewer's that are up but on no entry: sent before a page was loaded again. */
export function loosePhotos(viewer: Viewer, photos: CasePhoto[]): NamedPhoto[] {
  const own = viewer.kind === 'staff' ? viewer.name : null;
  return photos
    .filter(
      ({ links, addedBy, state }) => links.length === 0 && addedBy === own && state !== 'failed',
    )
    .map(({ id, n, state }) => ({
      ...{ id, name: `Photo ${n}`, caption: '', bench: false },
      thumb: thumbPath({ id, state }),
      leaveOut: 'Not on this entry',
    }));
}

/** The photos of a draft, up or expected. */
export function entryPhotos({ photos, expected }: TimelineEntry): NamedPhoto[] {
  return [
    ...photos.map(({ id, n, caption, visibility, state }) => ({
      ...{ id, caption, name: `Photo ${n}`, thumb: thumbPath({ id, state }) },
      bench: visibility === 'bench',
      leaveOut: 'Take it off',
    })),
    ...expected.map(({ id, caption }) => ({
      ...{ id, caption, name: 'A photo not up yet', thumb: null, bench: false },
      leaveOut: 'Do not wait for it',
    })),
  ];
}

/** The photos on their way from this page, without those that are named already. */
export function comingPhotos(coming: GoingUpView[], named: NamedPhoto[]): NamedPhoto[] {
  const there = new Set(named.map(({ id }) => id));
  return coming
    .filter(({ id, state, final }) => !there.has(id) && !(state === 'failed' && final))
    .map(({ id, name, thumb }) => ({
      ...{ id, name, caption: '', bench: false, leaveOut: null },
      thumb: thumb ?? null,
    }));
}
