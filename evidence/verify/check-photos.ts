import { fromHex } from '#evidence/bytes/hex.ts';
import type { EntryShown, TextShown } from '#evidence/chain/entry-shown.ts';
import { isStoryKind } from '#evidence/seal/kinds.ts';
import { attempt, itemsOf, placeOf, type Item, type Work } from '#evidence/verify/work.ts';

/**
 * What can be said of photos without a file: the bundle lists those of each header, no number is
 * used twice in an entry and its amendments, and words and copies speak of photos there are.
 */
export function checkPhotos(work: Work): void {
  const { findings, chain } = work;
  const numbers = new Map<string, Set<number>>();
  let comparable = 0;
  for (const item of chain) {
    if (!item.header || !item.entry) continue;
    const own = item.header.photos.map(({ n }) => n);
    const listed = item.entry.photos.map(({ n }) => n);
    if (own.join() !== listed.join()) {
      findings.failed('photos', { ...placeOf(item), because: 'not the photos of its header' });
    }
    comparable += item.entry.photos.filter((photo) => photo.published ?? photo.original).length;
    const story = storyOf(work, item);
    if (!story || item.commitment === null) continue;
    const before = numbers.get(story) ?? new Set<number>();
    if (own.some((n) => before.has(n))) {
      findings.failed('photos', { ...placeOf(item), because: 'a photo number is used twice' });
    }
    const all = new Set([...before, ...own]);
    numbers.set(story, all);
    checkWords(work, item, own, all);
  }
  if (chain.some(({ header }) => header && header.photos.length > 0)) {
    findings.line('photos', 'not-checked', { count: comparable });
  }
}

/** C of the entry whose photos an entry shares: its own, or the one it amends if that is here. */
function storyOf({ chain }: Work, item: Item): string | null {
  if (item.header?.kind !== 'amendment') return item.commitment;
  const original = chain.find(({ commitment }) => commitment === item.header?.names[0]);
  return original?.commitment ?? null;
}

function checkWords({ findings }: Work, item: Item, own: number[], all: Set<number>): void {
  const kind = item.header!.kind;
  const shown = item.parts.get('shown') as EntryShown | TextShown | undefined;
  if (!shown || shown.v === 1 || (!isStoryKind(kind) && kind !== 'amendment')) return;
  const amends = kind === 'amendment';
  const shared = item.header!.photos.flatMap((p) => (p.visibility === 'shared' ? [p.n] : []));
  const speakable = amends ? [...all] : shared;
  if (!shown.photos.every(({ n }) => speakable.includes(n))) {
    findings.failed('photos', {
      ...placeOf(item),
      because: 'words about a photo it does not share',
    });
  }
  const copied = shown.copies.every(({ n, of }) => amends && own.includes(n) && all.has(of));
  if (!copied || shown.copies.some(({ n, of }) => n === of)) {
    findings.failed('photos', { ...placeOf(item), because: 'a copy of a photo there is not' });
  }
}

/** No salt comes twice, and each is 32 bytes as hex: a salt used again would tell what it hides. */
export function checkSalts(work: Work): void {
  const seen = new Set<string>();
  for (const item of itemsOf(work)) {
    if (!item.entry) continue;
    const { salt, parts, photos } = item.entry;
    const salts = [
      salt,
      ...Object.values(parts).map((part) => part.salt),
      ...photos.flatMap(({ original, published }) => [original, published]),
    ].filter((one) => one !== null);
    for (const one of salts) {
      attempt(work.findings, 'salts', placeOf(item), () => fromHex(one, 32));
      if (seen.has(one)) {
        work.findings.failed('salts', { ...placeOf(item), because: 'a salt comes twice' });
      }
      seen.add(one);
    }
  }
}
