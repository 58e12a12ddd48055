import { validate } from 'uuid';
import { formatCaseNumber } from '#domain/case-number.ts';
import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import { photoScope } from './photo-scope.ts';

/** A photo's file as it can be fetched. */
export interface Media {
  objectKey: string;
  mediaType: string;
  bytes: number;
  /** In hex: names the bytes for good. */
  sha256: string;
  /** For an original: what it is to be called when it is saved. */
  saveAs: string | null;
}

interface Row {
  objectKey: string;
  mediaType: string;
  bytes: string | number;
  sha256: Buffer;
  number: number;
  year: number;
  ordinal: number;
}

const ENDINGS: Record<string, string> = {
  'image/jpeg': 'jpg',
  'image/png': 'png',
  'image/webp': 'webp',
  'image/heic': 'heic',
};

const ORIGINAL = `SELECT f.object_key AS objectKey, f.media_type AS mediaType, f.bytes, f.sha256,
  f.number, c.year, c.ordinal FROM photos f JOIN cases c ON c.id = f.case_id`;

const COPY = `SELECT k.object_key AS objectKey, 'image/webp' AS mediaType, k.bytes, k.sha256,
  f.number, c.year, c.ordinal
  FROM photos f JOIN cases c ON c.id = f.case_id
  JOIN photo_copies k ON k.photo_id = f.id AND k.edge = :edge`;

/**
 * Finds the original of a photo (for the shop's people only) or one of its copies.
 * Throws NotFound for whatever the viewer may not see, as for what is not there.
 */
export async function findMedia(
  viewer: Viewer,
  { photoId, size }: { photoId: string; size: string },
): Promise<Media> {
  demand(viewer, 'see cases', { own: true });
  const missing = new NotFound('There is no such photo. Open the case again.');
  const original = size === 'original';
  if (!validate(photoId) || !/^(original|2048|960|320)$/.test(size)) throw missing;
  if (original && viewer.kind !== 'staff') throw missing;
  const scope = photoScope(viewer);
  const [row] = await select<Row>(
    `${original ? ORIGINAL : COPY} WHERE f.id = :photoId AND ${scope.sql}`,
    { ...scope.params, photoId, ...(original ? {} : { edge: Number(size) }) },
  );
  if (!row) throw missing;
  const name = `${formatCaseNumber(row)}-photo-${row.number}.${ENDINGS[row.mediaType] ?? 'bin'}`;
  return {
    objectKey: row.objectKey,
    mediaType: row.mediaType,
    bytes: Number(row.bytes),
    sha256: row.sha256.toString('hex'),
    saveAs: original ? name : null,
  };
}
