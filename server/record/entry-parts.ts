import type { PhotoWords } from '#evidence/chain/entry-shown.ts';
import type { PartName } from '#evidence/seal/kinds.ts';
import type { Role } from '#domain/viewer.ts';
import type { DraftToSeal } from './draft-to-seal.ts';
import { entryBody, photoWords } from './entry-body.ts';
import { personInRecord } from './person-in-record.ts';

type Parts = Partial<Record<PartName, object>>;
type Named = { name: string; role: Role; number: number };

/** The part that stays in the shop; none when nothing does. */
function benchPart(entry: DraftToSeal, words: PhotoWords[]): Parts {
  const { benchNote: text, minutes } = entry.draft;
  if (entry.visibility === 'bench') {
    return { bench: { v: 2, text, minutes, entry: entryBody(entry, words), photos: [] } };
  }
  const photos = photoWords(entry.photos.filter(({ visibility }) => visibility === 'bench'));
  if (photos.length > 0) return { bench: { v: 2, text, minutes, entry: null, photos } };
  return text === '' && minutes === null ? {} : { bench: { v: 1, text, minutes } };
}

/**
 * The parts of an entry: what may be shown, what stays in the shop, and the names behind roles and
 * numbers.
 * @param earlier what is already said about the photos of the entry that this one corrects
 * @param sealer whoever seals it
 */
export function entryParts(entry: DraftToSeal, earlier: PhotoWords[], sealer: Named): Parts {
  const own = entry.photos.filter(
    ({ visibility }) => entry.visibility === 'bench' || visibility === 'shared',
  );
  const words = [...earlier, ...photoWords(own)].sort((a, b) => a.n - b.n);
  const people = [entry.author, sealer].filter((person) => person !== null);
  const names = Object.fromEntries(people.map((person) => [personInRecord(person), person.name]));
  return {
    ...(entry.visibility === 'shared' ? { shown: { v: 2, ...entryBody(entry, words) } } : {}),
    ...benchPart(entry, words),
    staff: { v: 1, names },
  };
}
