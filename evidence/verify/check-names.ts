import type { CloseShown, StandingShown } from '#evidence/chain/case-shown.ts';
import type { KeyShown } from '#evidence/chain/log-shown.ts';
import { isCaseKind, isLogKind, isStoryKind, type Kind } from '#evidence/seal/kinds.ts';
import { placeOf, shownOf, type Item, type Work } from '#evidence/verify/work.ts';

/** What `names` of an entry may be held against: the chain it stands in, up to itself. */
type Before = {
  /** C of every earlier entry by seq; undefined where it is not known here. */
  order: (string | null | undefined)[];
  /** Earlier items by C. */
  items: Map<string, Item>;
  /** The latest close before it. */
  close: Item | undefined;
  /** Whether any earlier entry is lost or of a form not known here. */
  gaps: boolean;
  /** How many photos the earlier entries have; null where that is not known here. */
  photos: number | null;
};
type Named = Item & { header: NonNullable<Item['header']> };

/** Holds `names` of every entry against the rule of its kind. */
export function checkNames(work: Work): void {
  const { findings } = work;
  for (const items of [work.own, work.chain]) {
    const order = orderBefore(items[0]);
    const before: Before = { order, items: new Map(), close: undefined, gaps: false, photos: null };
    if (items[0]?.seq === 0) before.photos = 0;
    for (const item of items) {
      if (item.header) {
        const because = problem(item as Named, before);
        if (because) findings.failed('names', { ...placeOf(item), because });
      }
      order[item.seq] = item.commitment;
      if (item.commitment) before.items.set(item.commitment, item);
      if (item.header?.kind === 'close') before.close = item;
      before.gaps ||= item.header === null;
      const photos = item.header?.photos.length ?? null;
      before.photos = before.photos === null || photos === null ? null : before.photos + photos;
    }
  }
  if (!findings.anyFailed('names')) findings.checked('names');
}

/** A record that begins at a close knows what came before it from the close itself. */
function orderBefore(first: Item | undefined): Before['order'] {
  if (first?.header?.kind === 'close') return [...first.header.names];
  return Array.from({ length: first?.seq ?? 0 }, () => undefined);
}

function problem(item: Named, before: Before): string | null {
  const { kind, names } = item.header;
  if (!isCaseKind(kind) && !isLogKind(kind)) return null;
  const places = names.map((name) => before.order.slice(0, item.seq).indexOf(name));
  if (places.includes(-1) && !before.gaps) return 'it names what is not an earlier entry';
  if (places.some((place, at) => at > 0 && place >= 0 && place <= places[at - 1]!)) {
    return 'it names entries out of order';
  }
  return RULES[kind]?.(item, before) ?? (RULES[kind] || names.length === 0 ? null : NONE);
}

const NONE = 'it names an entry, and its kind names none';

type Rule = (item: Named, before: Before) => string | null;

/** The rules of the kinds that name others; every other kind names none. */
const RULES: Partial<Record<Kind, Rule>> = {
  amendment: ({ header: { names } }, { items }) => {
    const original = items.get(names[0] ?? '')?.header?.kind;
    const story = original === undefined || isStoryKind(original) || !isCaseKind(original);
    return names.length === 1 && story ? null : 'it amends what is not one entry of the story';
  },
  close: (item, { order, photos }) => {
    const { names, prev } = item.header;
    const before = order.slice(0, item.seq);
    const all =
      names.length === item.seq && before.every((name, at) => name == null || name === names[at]);
    const last = prev === null || names.at(-1) === prev;
    const shown = shownOf<CloseShown>(item, 'close');
    const counts = shown?.entries === names.length && shown.photos === (photos ?? shown.photos);
    if (shown && !counts) return 'it counts other entries or photos than there are';
    return all && last ? null : 'it does not list all that was before it';
  },
  'handed-back': ({ header: { names, prev } }, before) => {
    const latest = namesLatestClose(names, before) && prev === names[0];
    return latest ? null : 'it does not follow the latest close';
  },
  warranty: ({ header: { names } }, before) =>
    namesLatestClose(names, before) ? null : 'it does not name the latest close',
  paper: aboutOneWarranty,
  claim: aboutOneWarranty,
  standing: (item, before) => {
    const act = shownOf<StandingShown>(item, 'standing')?.act;
    const { names } = item.header;
    const most = act === undefined || act === 'replace' ? 2 : 1;
    const least = act === 'replace' ? 2 : 1;
    const count = names.length >= least && names.length <= most;
    return count && names.every((name) => isWarranty(name, before)) ? null : ABOUT_WARRANTY;
  },
  visibility: atLeastOne,
  erased: atLeastOne,
  key: (item, { items }) => {
    const shown = shownOf<KeyShown>(item, 'key');
    const { names } = item.header;
    if (shown?.act === 'add') return names.length === 0 ? null : NONE;
    const added = shownOf<KeyShown>(items.get(names[0] ?? '') ?? item, 'key');
    const right = names.length === 1 && (!shown || (added?.act === 'add' && added.id === shown.id));
    return right ? null : 'it does not name where its key was added';
  },
};

const ABOUT_WARRANTY = 'it does not name the warranty it is about';

function namesLatestClose(names: string[], { close, gaps }: Before): boolean {
  return names.length === 1 && (gaps || names[0] === close?.commitment);
}

function isWarranty(name: string, { items }: Before): boolean {
  const kind = items.get(name)?.header?.kind;
  return kind === undefined || kind === 'warranty';
}

function aboutOneWarranty({ header: { names } }: Named, before: Before): string | null {
  return names.length === 1 && isWarranty(names[0]!, before) ? null : ABOUT_WARRANTY;
}

function atLeastOne({ header: { names } }: Named): string | null {
  return names.length > 0 ? null : 'it names no entry';
}
