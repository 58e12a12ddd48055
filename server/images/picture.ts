import { createJimp } from '@jimp/core';
import type { PhotoType } from '#domain/photo-file.ts';
import { heic, jpeg, png, webp } from './formats.ts';
import { shrink } from './shrink.ts';
import { turnUpright } from './turn-upright.ts';

const FORMATS = { 'image/jpeg': jpeg, 'image/png': png, 'image/webp': webp, 'image/heic': heic };

/** A picture in memory: jimp's image object, with the shop's photo formats. */
export const Picture = createJimp({ formats: Object.values(FORMATS) });
export type Picture = InstanceType<typeof Picture>;

/**
 * Reads a photo file as it is stored, not upright (only HEIC comes upright). A JPEG may come smaller
 * than it is, with a long side of at least `edge` px. Throws when the file cannot be decoded.
 */
export async function readPicture(file: Buffer, type: PhotoType, edge: number): Promise<Picture> {
  // Not Picture.fromBuffer, which would turn it at full size, and only by a JPEG's Exif.
  return new Picture(await FORMATS[type]().decode(file, { edge }));
}

/** The picture as it is to be seen, by an Exif orientation. */
export function upright(picture: Picture, orientation: number): Picture {
  return new Picture(turnUpright(picture.bitmap, orientation));
}

/** The picture with a long side of at most `edge` px. */
export async function shrunk(picture: Picture, edge: number, opaque: boolean): Promise<Picture> {
  return new Picture(await shrink(picture.bitmap, edge, opaque));
}
