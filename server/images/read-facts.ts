import exifr from 'exifr';
import type { PhotoType } from '#domain/photo-file.ts';
import { type TakenTime, takenTime } from './exif-time.ts';
import { chunksIn } from './webp-chunks.ts';

/** What the metadata of a photo says, as much as the shop keeps of it. */
export interface PhotoFacts {
  /** 1 to 8; 1 where nothing is said. */
  orientation: number;
  taken: TakenTime | null;
  /** Whether the file tells, or may tell, where it was taken. The place itself is never kept. */
  hasPosition: boolean;
}

const TAGS = [
  'Orientation',
  'DateTimeOriginal',
  'OffsetTimeOriginal',
  'SubSecTimeOriginal',
  'CreateDate',
  'OffsetTimeDigitized',
  'SubSecTimeDigitized',
  'GPSLatitude',
  'GPSLongitude',
];

// Beside Exif: XMP packets, and the films that phones hide behind a photo.
const POSITION_WORDS = ['GPSLatitude', 'GPSLongitude', '\xa9xyz', 'ISO6709'];

type Tags = Record<string, unknown>;

/** Exif as written in the file; `null` when it is there but cannot be read. */
async function readTags(file: Buffer, type: PhotoType): Promise<Tags | null> {
  // exifr knows no WebP, but the TIFF structure in its EXIF chunk.
  const exif = [...(type === 'image/webp' ? chunksIn(file) : [])].find((c) => c.type === 'EXIF');
  if (type === 'image/webp' && exif === undefined) return {};
  try {
    // Revived dates would be taken for the server's own time zone.
    const options = { reviveValues: false, translateValues: false, pick: TAGS };
    const tags = (await exifr.parse(exif?.body ?? file, options)) as Tags | undefined;
    return tags ?? {};
  } catch {
    return null;
  }
}

/** Reads what the shop keeps of a photo's metadata. Metadata that cannot be read is taken for none, but for a possible position. */
export async function readFacts(file: Buffer, type: PhotoType): Promise<PhotoFacts> {
  const tags = await readTags(file, type);
  const { Orientation: said } = tags ?? {};
  const found = typeof said === 'number' && said >= 1 && said <= 8 ? said : 1;
  return {
    orientation: found,
    taken:
      takenTime(tags?.DateTimeOriginal, tags?.OffsetTimeOriginal, tags?.SubSecTimeOriginal) ??
      takenTime(tags?.CreateDate, tags?.OffsetTimeDigitized, tags?.SubSecTimeDigitized),
    hasPosition:
      tags === null ||
      tags.GPSLatitude !== undefined ||
      tags.GPSLongitude !== undefined ||
      POSITION_WORDS.some((word) => file.includes(word, 0, 'latin1')),
  };
}
