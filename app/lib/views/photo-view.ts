import type { TimelinePhoto } from '#domain/timeline.ts';
import type { PhotoView, ThumbView } from '#app/ui/types.ts';
import { placeholderUrl } from '../format/placeholder.ts';

/** Where a photo's file of one size is: `size` is its long edge in px. */
export const mediaPath = (photoId: string, size: 320 | 960 | 2048) =>
  `/api/media/${photoId}/${size}`;

const LARGEST = 2048;

/** Size in px of the largest copy of a photo, upright. */
function copySize(width: number, height: number) {
  const shrink = Math.min(1, LARGEST / Math.max(width, height, 1));
  return { width: Math.round(width * shrink), height: Math.round(height * shrink) };
}

const notes = {
  ready: undefined,
  waiting: undefined,
  failed: 'This file cannot be shown. Take it off the entry and add the photo again.',
};

/**
 * A photo of the timeline as the pages show it; `href` opens it in full. The caption is what it
 * shows, so it is the text for those who do not see it too.
 */
export function photoView(photo: TimelinePhoto, href?: string): PhotoView {
  const { id, n, caption, state, failedBecause, placeholder, pins } = photo;
  return {
    id,
    n,
    caption: caption || 'Not yet described',
    alt: caption || `Photo ${n}, not yet described`,
    state: state === 'ready' ? 'ready' : state === 'waiting' ? 'preparing' : 'missing',
    note: failedBecause ?? notes[state],
    src320: mediaPath(id, 320),
    src960: mediaPath(id, 960),
    src2048: mediaPath(id, 2048),
    ...copySize(photo.width, photo.height),
    placeholder: placeholder === null ? undefined : placeholderUrl(placeholder),
    pins: pins.map((pin) => ({
      n: pin.n,
      kind: pin.kind,
      x: pin.x / 100,
      y: pin.y / 100,
      title: pin.label,
      text: pin.note,
    })),
    href: state === 'ready' ? href : undefined,
  };
}

/** A small picture of a case. */
export function thumbView(photo: {
  photoId: string;
  width: number;
  height: number;
  placeholder: string | null;
}): ThumbView {
  const shrink = Math.min(1, 320 / Math.max(photo.width, photo.height, 1));
  return {
    src: mediaPath(photo.photoId, 320),
    width: Math.round(photo.width * shrink),
    height: Math.round(photo.height * shrink),
    placeholder: photo.placeholder === null ? undefined : placeholderUrl(photo.placeholder),
  };
}
