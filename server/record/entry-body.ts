import { toInstant } from '#evidence/bytes/instant.ts';
import type { EntryBody, PhotoWords } from '#evidence/chain/entry-shown.ts';
import type { DraftPhoto } from './draft-photos.ts';
import type { DraftToSeal } from './draft-to-seal.ts';
import { personInRecord } from './person-in-record.ts';

/** What is said about photos, as a sealed part lists it. */
export function photoWords(photos: DraftPhoto[]): PhotoWords[] {
  return photos.map(({ n, caption, taken, pins }) => ({
    n,
    caption: caption ?? '',
    taken,
    pins: pins.map(({ number, x, y, kind, label, note }) => ({
      n: number,
      x,
      y,
      kind,
      label,
      text: note,
    })),
  }));
}

/** Climate as one reading of both; a single reading is kept as a line among what was used. */
function climateOf({ draft: { temperature, humidity, used } }: DraftToSeal) {
  const t = temperature === null ? null : { q: temperature, u: '°C' };
  const h = humidity === null ? null : { q: humidity, u: '%' };
  if (t && h) return { climate: { temperature: t, humidity: h }, used };
  const single = t ?? h;
  return {
    climate: null,
    used: single ? [...used, `${single.q}\u00a0${single.u} at the bench`] : used,
  };
}

function restOf({ rest }: DraftToSeal): EntryBody['rest'] {
  const instant = (at: Date | null) => at && toInstant(at);
  return (
    rest && {
      product: rest.product,
      from: toInstant(rest.startedAt),
      clampsOff: instant(rest.clampsOffAt),
      worked: instant(rest.workedAt),
      strings: instant(rest.stringsAt),
    }
  );
}

/**
 * The words of a draft as they are sealed; people by role and number.
 * @param photos what is said about its photos, those of the entry it corrects included
 */
export function entryBody(entry: DraftToSeal, photos: PhotoWords[]): EntryBody {
  const { draft, phase, author } = entry;
  if (!author) throw new Error('A draft has somebody who wrote it.');
  return {
    phase,
    title: draft.title,
    text: draft.text,
    occurred: draft.occurredClock,
    ...climateOf(entry),
    rest: restOf(entry),
    by: personInRecord(author),
    photos,
    copies: [],
  };
}
