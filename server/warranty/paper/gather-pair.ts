import { buffer } from 'node:stream/consumers';
import { Jimp } from 'jimp';
import { dayIn } from '#domain/calendar.ts';
import { decodeWebp } from '#server/images/webp-codec.ts';
import { getStream } from '#server/storage/objects.ts';
import { dayInWords } from '../words.ts';
import type { PaperFacts, PaperPicture } from './paper-facts.ts';
import { photoCandidates, type SealedPhoto } from './photo-candidates.ts';
import { pickPair } from './pick-pair.ts';

const QUALITY = 88;

/** A PDF takes JPEG, the copies are WebP. */
async function picture(
  { objectKey, caption, at }: SealedPhoto,
  zone: string,
): Promise<PaperPicture> {
  const file = await getStream(objectKey);
  if (!file) throw new Error('A photo’s copy is not in the store. Run npm run log:check.');
  const jpeg = await Jimp.fromBitmap(await decodeWebp(await buffer(file))).getBuffer('image/jpeg', {
    quality: QUALITY,
  });
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
