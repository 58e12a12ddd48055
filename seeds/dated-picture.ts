import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { Temporal } from 'temporal-polyfill';

const PICTURES = join(import.meta.dirname, 'pictures');
const CLOCK = /\d{4}:\d{2}:\d{2} \d{2}:\d{2}:\d{2}/g;
const OFFSET = /[+-]\d{2}:00(?=\0)/g;
/** Where a camera writes its metadata; the picture itself begins later. */
const METADATA_BYTES = 8192;

/**
 * A picture of the demo whose camera clock says `takenAt`, in the shop's zone. The demo's days move
 * with its first start, and a photo taken before the instrument came in would contradict the record.
 * Only the digits change: no byte moves.
 */
export async function datedPicture(path: string, takenAt: Date, zone: string): Promise<Buffer> {
  const bytes = await readFile(join(PICTURES, path));
  const at = Temporal.Instant.fromEpochMilliseconds(takenAt.getTime()).toZonedDateTimeISO(zone);
  const clock = at.toPlainDateTime().toString({ smallestUnit: 'second' });
  const metadata = bytes
    .toString('latin1', 0, METADATA_BYTES)
    .replace(CLOCK, clock.replaceAll('-', ':').replace('T', ' '))
    .replace(OFFSET, at.offset);
  return Buffer.concat([Buffer.from(metadata, 'latin1'), bytes.subarray(METADATA_BYTES)]);
}
