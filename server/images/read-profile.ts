import { inflateSync } from 'node:zlib';
import type { PhotoType } from '#domain/photo-file.ts';
import { boxesIn, propertiesIn } from './heic-boxes.ts';
import { segmentsIn } from './jpeg-segments.ts';
import { pngChunksIn } from './png-chunks.ts';
import { chunksIn } from './webp-chunks.ts';

/** Display profiles have 0.5 to 15 kB, the largest in use 60 kB. */
const MAX_PROFILE = 128_000;

const MARK = Buffer.from('ICC_PROFILE\0', 'latin1');

/** APP2 segments, numbered from 1 (ICC.1:2022 B.4). */
function inJpeg(file: Uint8Array): Uint8Array | undefined {
  const pieces = [...segmentsIn(file)]
    .filter(({ marker, body }) => marker === 0xe2 && MARK.equals(body.subarray(0, MARK.length)))
    .map(({ body }) => ({ number: body[MARK.length] ?? 0, bytes: body.subarray(MARK.length + 2) }))
    .sort((a, b) => a.number - b.number);
  return pieces.length === 0 ? undefined : Buffer.concat(pieces.map(({ bytes }) => bytes));
}

/** The iCCP chunk: a name, a zero, the method 0, deflated bytes (PNG 11.3.2.3). */
function inPng(file: Uint8Array): Uint8Array | undefined {
  for (const { type, body } of pngChunksIn(file)) {
    if (type !== 'iCCP') continue;
    return inflateSync(body.subarray(body.indexOf(0) + 2), { maxOutputLength: MAX_PROFILE });
  }
  return undefined;
}

const inWebp = (file: Uint8Array) => [...chunksIn(file)].find(({ type }) => type === 'ICCP')?.body;

/** A `colr` property of type `prof` or `rICC` (ISO/IEC 14496-12 12.1.5). */
function inHeic(file: Uint8Array): Uint8Array | undefined {
  const meta = [...boxesIn(file)].find(({ type }) => type === 'meta');
  for (const { type, body } of meta === undefined ? [] : propertiesIn(meta.body)) {
    const kind = String.fromCharCode(...body.subarray(0, 4));
    if (type === 'colr' && (kind === 'prof' || kind === 'rICC')) return body.subarray(4);
  }
  return undefined;
}

const READERS: Record<PhotoType, (file: Uint8Array) => Uint8Array | undefined> = {
  'image/jpeg': inJpeg,
  'image/png': inPng,
  'image/webp': inWebp,
  'image/heic': inHeic,
};

/**
 * The colour profile in a photo file, cut to the length it gives itself, or null when there is none
 * that fits RGB pixels (ICC.1:2022 7.2: size, colour space and signature in the header).
 */
export function readProfile(file: Uint8Array, type: PhotoType): Uint8Array | null {
  let found: Uint8Array | undefined;
  try {
    found = READERS[type](file);
  } catch {
    return null;
  }
  if (found === undefined || found.length < 128) return null;
  const header = Buffer.from(found.buffer, found.byteOffset, found.byteLength);
  const length = header.readUInt32BE(0);
  const isOurs =
    header.toString('latin1', 16, 20) === 'RGB ' && header.toString('latin1', 36, 40) === 'acsp';
  if (!isOurs || length < 128 || length > found.length || length > MAX_PROFILE) return null;
  return found.subarray(0, length);
}
