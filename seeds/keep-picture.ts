import { createHash } from 'node:crypto';
import { basename } from 'node:path';
import { v7 } from 'uuid';
import type { StaffViewer } from '#domain/viewer.ts';
import { putPhoto } from '#server/photos/put-photo.ts';
import { datedPicture } from './dated-picture.ts';
import { DEMO_ZONE } from './demo-shop.ts';

/** A picture of the demo: its file under seeds/pictures, what it shows, and its pins. */
export interface Picture {
  file: string;
  caption: string;
  /** When the camera says it was taken; by default when it was written down. */
  takenAt?: Date;
  /** x, y in percent of the upright photo from its left and top. */
  pins?: { x: number; y: number; kind: 'damage' | 'remark'; label: string; note: string }[];
}

async function* whole(bytes: Uint8Array) {
  yield await Promise.resolve(bytes);
}

/** Puts a picture into a case as a phone would, its camera's clock set back with it. Returns its id. */
export async function keepPicture(
  by: StaffViewer,
  caseNumber: string,
  { file, takenAt }: Picture,
  now: Date,
): Promise<string> {
  const bytes = await datedPicture(file, takenAt ?? now, DEMO_ZONE);
  const photo = {
    caseNumber,
    photoId: v7(),
    fileName: basename(file),
    entryId: null,
    sha256: createHash('sha256').update(bytes).digest('hex'),
    length: bytes.length,
    mediaType: 'image/jpeg',
  };
  const kept = await putPhoto(by, photo, whole(bytes), { now });
  return kept.photo.id;
}
