import { buffer } from 'node:stream/consumers';
import { defaultFormats } from 'jimp';
import { dayIn } from '#domain/calendar.ts';
import type { Pixels } from '#server/images/pixels.ts';
import { decodeWebp } from '#server/images/webp-codec.ts';
import { getStream } from '#server/storage/objects.ts';
import { dayInWords } from '../words.ts';
import type { PaperFacts, PaperPicture } from './paper-facts.ts';
import { photoCandidates, type SealedPhoto } from './photo-candidates.ts';
import { pickPair } from './pick-pair.ts';

const QUALITY = 88;

/** jimp's own JPEG format; its table of formats gives each a type of its own. */
type Encoder = {
  mime: string;
  encode(pixels: Pixels, options: { quality: number }): Promise<Buffer> | Buffer;
};

function jpegOf(pixels: Pixels): Promise<Buffer> | Buffer {
  const formats = defaultFormats.map((make) => make() as unknown as Encoder);
  const format = formats.find(({ mime }) => mime === 'image/jpeg');
  if (!format) throw new Error('jimp does not write JPEG.');
  return format.encode(pixels, { quality: QUALITY });
}

/** A PDF takes JPEG, the copies are WebP. */
async function picture(
  { objectKey, caption, at }: SealedPhoto,
  zone: string,
): Promise<PaperPicture> {
  const file = await getStream(objectKey);
  if (!file) throw new Error('A photo’s copy is not in the store. Run npm run log:check.');
  const jpeg = await jpegOf(await decodeWebp(await buffer(file)));
  const day = dayInWords(dayIn(at, zone)).replace(/ \d{4}$/, '');
  return { jpeg, day, caption };
}

/** The pair of pictures for the first page; null when one side has none. */
export async function gatherPair(caseId: string, zone: string): Promise<PaperFacts['pair']> {
  const photos = await photoCandidates(caseId);
  const of = (phase: string) => photos.filter((photo) => photo.phase === phase);
  const pair = pickPair(of('before'), of('after'));
  if (!pair) return null;
  const [before, after] = await Promise.all([
    picture(pair.before, zone),
    picture(pair.after, zone),
  ]);
  return { before, after };
}
