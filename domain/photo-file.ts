/** The kinds of photo file that the shop reads. */
export const PHOTO_TYPES = ['image/jpeg', 'image/png', 'image/webp', 'image/heic'] as const;
export type PhotoType = (typeof PHOTO_TYPES)[number];

/** The largest photo file, in bytes. */
export const MAX_PHOTO_BYTES = 50_000_000;

/** The most pixels a photo may have: the largest stills of today's phones have 50 and 64 million. */
export const MAX_PHOTO_PIXELS = 65_000_000;

/** How many bytes from the beginning `sniffPhoto` looks at. */
export const SNIFFED_BYTES = 32;

// ISO/IEC 23008-12 (HEIF) brands of still pictures coded with HEVC, and the two general ones.
const HEIC_BRANDS = new Set(['heic', 'heix', 'heim', 'heis', 'mif1', 'mif2']);

const ascii = (bytes: Uint8Array, from: number, to: number) =>
  String.fromCharCode(...bytes.subarray(from, to));

/**
 * The kind of photo by the file's first bytes (`SNIFFED_BYTES` are enough), whatever its name or
 * header says; null for anything else.
 * Signatures: ITU-T T.81 B.1.1.3 (SOI), PNG 5.2, RFC 9649 2.3 (WebP), ISO/IEC 14496-12 4.3 (ftyp).
 */
export function sniffPhoto(head: Uint8Array): PhotoType | null {
  if (head[0] === 0xff && head[1] === 0xd8 && head[2] === 0xff) return 'image/jpeg';
  if (ascii(head, 0, 8) === '\x89PNG\r\n\x1a\n') return 'image/png';
  if (ascii(head, 0, 4) === 'RIFF' && ascii(head, 8, 12) === 'WEBP') return 'image/webp';
  if (ascii(head, 4, 8) === 'ftyp' && HEIC_BRANDS.has(ascii(head, 8, 12))) return 'image/heic';
  return null;
}

/** Whether a sender's word for the type fits what the file is: HEIF is the general name of HEIC. */
export function isTypeOf(said: string, found: PhotoType): boolean {
  const type = said.split(';')[0]?.trim().toLowerCase() ?? '';
  return type === found || (found === 'image/heic' && type === 'image/heif');
}

/** For a file that `sniffPhoto` does not know. */
export const NOT_A_PHOTO =
  'This file is not a photo the shop can read. Send JPEG, PNG, WebP or HEIC.';

/** For a file without a byte. */
export const EMPTY_PHOTO = 'This file is empty. Choose the photo again.';

const megabytes = (bytes: number) => String(Math.round(bytes / 1_000_000));

/** What is wrong with a photo of `length` bytes, then what to do; null when nothing is. */
export function sizeSentence(length: number): string | null {
  if (length === 0) return EMPTY_PHOTO;
  if (length <= MAX_PHOTO_BYTES) return null;
  return `This file has ${megabytes(length)} MB and the shop takes ${megabytes(MAX_PHOTO_BYTES)}. Make the photo smaller and send it again.`;
}
