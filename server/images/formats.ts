import { defaultFormats } from 'jimp';
import { MAX_PHOTO_PIXELS } from '#domain/photo-file.ts';
import { decodeHeic } from './heic-codec.ts';
import type { Pixels } from './pixels.ts';
import { decodeJpeg } from './turbo-jpeg.ts';
import { decodeWebp, encodeWebp } from './webp-codec.ts';

/** jimp's own format; its table of formats gives each a type of its own, and none takes options. */
type Plain = { mime: string; decode(file: Buffer, options?: object): Pixels };
function plain(mime: string): Plain {
  const formats = defaultFormats.map((make) => make() as unknown as Plain);
  const found = formats.find((format) => format.mime === mime);
  if (found === undefined) throw new Error(`jimp does not read ${mime}`);
  return found;
}

const cannotEncode = (): never => {
  throw new Error('this format is only read');
};

/** JPEG decoded no larger than `edge` asks for; by jimp's own slower decoder where the fast one gives up (CMYK). */
export const jpeg = () => ({
  mime: 'image/jpeg' as const,
  encode: cannotEncode,
  decode: (file: Buffer, { edge = Infinity }: { edge?: number } = {}): Pixels => {
    try {
      return decodeJpeg(file, edge);
    } catch {
      const limits = {
        maxResolutionInMP: MAX_PHOTO_PIXELS / 1_000_000,
        maxMemoryUsageInMB: 1024,
        tolerantDecoding: false,
      };
      return plain('image/jpeg').decode(file, limits);
    }
  },
});

/** PNG by jimp's own decoder. */
export const png = () => ({
  mime: 'image/png' as const,
  hasAlpha: true,
  encode: cannotEncode,
  decode: (file: Buffer): Pixels => plain('image/png').decode(file),
});

/** WebP, the only format that is written, by libwebp. */
export const webp = () => ({
  mime: 'image/webp' as const,
  hasAlpha: true,
  encode: async (pixels: Pixels, { quality = 80 }: { quality?: number } = {}): Promise<Buffer> =>
    Buffer.from(await encodeWebp(pixels, quality)),
  decode: (file: Buffer): Promise<Pixels> => decodeWebp(file),
});

/** HEIC by libheif, which gives it upright. */
export const heic = () => ({
  mime: 'image/heic' as const,
  encode: cannotEncode,
  decode: (file: Buffer): Promise<Pixels> => decodeHeic(file),
});
