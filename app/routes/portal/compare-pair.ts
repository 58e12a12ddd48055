import type { TimelineEntry, TimelinePhoto } from '#domain/timeline.ts';

/** A photo with the entry it stands in. */
export interface Placed {
  photo: TimelinePhoto;
  entry: TimelineEntry;
}

const isUpright = ({ photo: { width, height } }: Placed) => height > width;

/**
 * A before and an after photo to lay side by side: the latest after photo and the first before photo of
 * the same shape. It is an offer to look, and says nothing about what the two show. Null without both.
 */
export function comparePair(timeline: TimelineEntry[]): { before: Placed; after: Placed } | null {
  const of = (phase: TimelineEntry['phase']) =>
    timeline
      .filter((entry) => entry.phase === phase)
      .flatMap((entry) => entry.photos.map((photo) => ({ photo, entry })))
      .filter(({ photo }) => photo.state === 'ready');
  const after = of('after').at(-1);
  const before = after && of('before').find((one) => isUpright(one) === isUpright(after));
  return before ? { before, after } : null;
}
