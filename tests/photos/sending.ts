import { createHash } from 'node:crypto';
import { v7 } from 'uuid';
import { select } from '#server/db/sql.ts';
import type { PhotoToPut } from '#server/photos/photo-to-put.ts';
import { listObjects } from '#server/storage/objects.ts';

/** SHA-256 in hex. */
export const sha256Of = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

/** What a browser says of this file when it sends it to a case. */
export const sent = (
  caseNumber: string,
  file: Uint8Array,
  change: Partial<PhotoToPut> = {},
): PhotoToPut => ({
  caseNumber,
  photoId: v7(),
  sha256: sha256Of(file),
  length: file.length,
  mediaType: 'image/jpeg',
  fileName: 'IMG_0001.jpg',
  entryId: null,
  ...change,
});

/** The file in pieces, as a network brings it. */
export async function* inPieces(file: Uint8Array, size = 16_384): AsyncGenerator<Uint8Array> {
  for (let at = 0; at < file.length; at += size) yield file.subarray(at, at + size);
}

/** Everything that is kept: how many photo rows, links and jobs, and how many objects. */
export async function whatIsKept(): Promise<Record<string, number>> {
  const [rows] = await select<Record<string, string>>(
    `SELECT (SELECT COUNT(*) FROM photos) AS photos,
            (SELECT COUNT(*) FROM photo_copies) AS copies,
            (SELECT COUNT(*) FROM entry_photos) AS links,
            (SELECT COUNT(*) FROM outbox WHERE kind = 'derive-photo') AS jobs,
            (SELECT SUM(last_photo) FROM cases) AS numbers`,
  );
  let objects = 0;
  for (const shelf of ['originals', 'copies'] as const)
    for await (const page of listObjects(shelf)) objects += page.length;
  const counted = Object.entries(rows ?? {}).map(([name, count]) => [name, Number(count)] as const);
  return { ...Object.fromEntries(counted), objects };
}
