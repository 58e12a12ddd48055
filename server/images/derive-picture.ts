import { rgbaToThumbHash } from 'thumbhash';
import type { PhotoType } from '#domain/photo-file.ts';
import { readPicture, shrunk, upright } from './picture.ts';
import { type PhotoFacts, readFacts } from './read-facts.ts';
import { readProfile } from './read-profile.ts';
import { isOpaque } from './shrink.ts';
import { swapsSides } from './turn-upright.ts';
import { PhotoWalk } from './walk-photo.ts';
import { withProfile } from './with-profile.ts';

/** Long sides of the copies in px, largest first: each is made from the one before it. */
export const COPY_EDGES = [2048, 960, 320] as const;
export type CopyEdge = (typeof COPY_EDGES)[number];

const QUALITY = 80;

/** The ThumbHash encoder takes no more. */
const PLACEHOLDER_EDGE = 100;

/** One WebP made from a photo: upright, without metadata but for the colour profile. */
export interface PictureCopy {
  edge: CopyEdge;
  width: number;
  height: number;
  bytes: Buffer;
}

/** Everything that is made from a photo's original. */
export interface DerivedPicture {
  /** Of the original, upright, in px. */
  width: number;
  height: number;
  copies: PictureCopy[];
  /** A ThumbHash. */
  placeholder: Buffer;
  facts: PhotoFacts;
}

/** Makes the copies, the placeholder and the facts from a photo file. Throws when it cannot be decoded. */
export async function derivePicture(file: Buffer, type: PhotoType): Promise<DerivedPicture> {
  const facts = await readFacts(file, type);
  const profile = readProfile(file, type);
  const orientation = type === 'image/heic' ? 1 : facts.orientation;
  const stored = await readPicture(file, type, COPY_EDGES[0]);
  const opaque = isOpaque(stored.bitmap);

  const copies: PictureCopy[] = [];
  let picture = upright(await shrunk(stored, COPY_EDGES[0], opaque), orientation);
  for (const edge of COPY_EDGES) {
    picture = await shrunk(picture, edge, opaque);
    const { width, height } = picture;
    const webp = await picture.getBuffer('image/webp', { quality: QUALITY });
    const bytes = profile === null ? webp : withProfile(webp, profile, { width, height, opaque });
    copies.push({ edge, width, height, bytes });
  }
  const { bitmap } = await shrunk(picture, PLACEHOLDER_EDGE, opaque);
  const placeholder = Buffer.from(rgbaToThumbHash(bitmap.width, bitmap.height, bitmap.data));
  return { ...fullSize(file, type, orientation, stored), copies, placeholder, facts };
}

/** A JPEG was decoded smaller than it is, so its size is read from its header. */
function fullSize(
  file: Buffer,
  type: PhotoType,
  orientation: number,
  stored: { width: number; height: number },
) {
  if (type === 'image/heic') return { width: stored.width, height: stored.height };
  const walk = new PhotoWalk();
  walk.push(file);
  const { width, height } = walk;
  return swapsSides(orientation) ? { width: height, height: width } : { width, height };
}
