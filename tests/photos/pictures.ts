import { crc32, deflateSync } from 'node:zlib';
import { Jimp } from 'jimp';
import { encodeWebp } from '#server/images/webp-codec.ts';
import { exifTiff, type ExifToWrite } from './exif.ts';

const COLOURS = [0xd03020ff, 0x20a040ff, 0x2040c0ff, 0xe0c020ff] as const;

/** A picture whose four corners differ: red, green, blue, yellow from the top left by rows. */
export function cornersPicture(width = 96, height = 64): InstanceType<typeof Jimp> {
  const picture = new Jimp({ width, height });
  picture.scan((x, y) => {
    const corner = (y * 2 < height ? 0 : 2) + (x * 2 < width ? 0 : 1);
    picture.setPixelColor(COLOURS[corner] ?? 0, x, y);
  });
  return picture;
}

/** A JPEG of that picture; `salt` makes the file another one with the same picture. */
export async function aJpeg({ width = 96, height = 64, salt = 0 } = {}): Promise<Buffer> {
  const jpeg = await cornersPicture(width, height).getBuffer('image/jpeg', { quality: 90 });
  if (salt === 0) return jpeg;
  const comment = Buffer.from(`\xff\xfe\0\x0a${String(salt).padStart(8, '0')}`, 'latin1');
  return Buffer.concat([jpeg.subarray(0, 2), comment, jpeg.subarray(2)]);
}

/** A JPEG whose coded data is noise, so that it is as large as photos are. */
export async function aLargeJpeg(width: number, height: number, seed = 1): Promise<Buffer> {
  const picture = new Jimp({ width, height });
  let state = seed;
  for (let at = 0; at < picture.bitmap.data.length; at += 1) {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    picture.bitmap.data[at] = at % 4 === 3 ? 255 : state >>> 24;
  }
  return picture.getBuffer('image/jpeg', { quality: 92 });
}

export const aPng = (width = 96, height = 64): Promise<Buffer> =>
  cornersPicture(width, height).getBuffer('image/png');

export async function aWebp(width = 96, height = 64): Promise<Buffer> {
  return Buffer.from(await encodeWebp(cornersPicture(width, height).bitmap, 90));
}

function pngChunk(type: string, body: Buffer): Buffer {
  const content = Buffer.concat([Buffer.from(type, 'latin1'), body]);
  const out = Buffer.alloc(content.length + 8);
  out.writeUInt32BE(body.length);
  content.copy(out, 4);
  out.writeUInt32BE(crc32(content), content.length + 4);
  return out;
}

/** The PNG with one more chunk, before the first IDAT. */
export function withPngChunk(png: Buffer, type: string, body: Buffer): Buffer {
  const at = png.indexOf('IDAT') - 4;
  return Buffer.concat([png.subarray(0, at), pngChunk(type, body), png.subarray(at)]);
}

export const withPngProfile = (png: Buffer, profile: Buffer) =>
  withPngChunk(png, 'iCCP', Buffer.concat([Buffer.from('p\0\0'), deflateSync(profile)]));

export const withPngExif = (png: Buffer, wanted: ExifToWrite) =>
  withPngChunk(png, 'eXIf', exifTiff(wanted));

/** The head of a PNG that says it has these sides; there is no picture behind it. */
export function pngHeader(width: number, height: number): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(width);
  head.writeUInt32BE(height, 4);
  head.set([8, 2, 0, 0, 0], 8);
  const chunks = [pngChunk('IHDR', head), pngChunk('IDAT', deflateSync(Buffer.alloc(9)))];
  const signature = Buffer.from('\x89PNG\r\n\x1a\n', 'latin1');
  return Buffer.concat([signature, ...chunks, pngChunk('IEND', Buffer.alloc(0))]);
}

/** The average colour around a corner of a picture, by its index as in `cornersPicture`. */
export function cornerColour(
  { data, width, height }: { data: Uint8Array; width: number; height: number },
  corner: number,
): [number, number, number] {
  const x = Math.floor(width * (corner % 2 === 0 ? 0.25 : 0.75));
  const y = Math.floor(height * (corner < 2 ? 0.25 : 0.75));
  const at = (y * width + x) * 4;
  return [data[at] ?? 0, data[at + 1] ?? 0, data[at + 2] ?? 0];
}

/** Which of the four colours is nearest: 0 to 3, as in `cornersPicture`. */
export function nearestCorner([red, green, blue]: [number, number, number]): number {
  const distances = COLOURS.map((colour) => {
    const [r, g, b] = [colour >>> 24, (colour >>> 16) & 255, (colour >>> 8) & 255];
    return (r - red) ** 2 + (g - green) ** 2 + (b - blue) ** 2;
  });
  return distances.indexOf(Math.min(...distances));
}
