import type { TimelineEntry, TimelinePhoto } from '#domain/timeline.ts';

/** A photo with the entry it stands in. */
export interface Placed {
  photo: TimelinePhoto;
  entry: TimelineEntry;
}

const isUpright = ({ photo: { width, height } }: Placed) => height > width;

// Short words join; the longer ones say what is to be seen.
const wordsOf = ({ photo: { caption } }: Placed) =>
  new Set(caption.toLowerCase().match(/\p{L}{4,}/gu) ?? []);

const shared = (a: Placed, b: Placed) => {
  const words = wordsOf(b);
  return [...wordsOf(a)].filter((word) => words.has(word)).length;
};

/**
 * A before and an after photo to lay side by side: the latest after photo, and of the before photos of
 * the same shape the one whose caption shares most words with it, the first of equals. It is an offer
 * to look, and says nothing about what the two show. Null without both.
 */
export function comparePair(timeline: TimelineEntry[]): { before: Placed; after: Placed } | null {
  const of = (phase: TimelineEntry['phase']) =>
    timeline
      .filter((entry) => entry.phase === phase)
      .flatMap((entry) => entry.photos.map((photo) => ({ photo, entry })))
      .filter(({ photo }) => photo.state === 'ready');
  const after = of('after').at(-1);
  if (!after) return null;
  const before = of('before')
    .filter((one) => isUpright(one) === isUpright(after))
    .reduce<Placed | null>(
      (best, one) => (best && shared(best, after) >= shared(one, after) ? best : one),
      null,
    );
  return before ? { before, after } : null;
}
