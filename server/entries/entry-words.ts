import { EntryDraftSchema, type EntryDraft } from '#domain/entry-draft.ts';
import type { TimelineEntry, TimelinePin } from '#domain/timeline.ts';
import type { EntryBody, PhotoWords } from '#evidence/chain/entry-shown.ts';
import type { SealedBench, SealedShown } from '#server/record/read-sealed.ts';

/** What an entry says, wherever its words are kept. */
export interface EntryWords extends Pick<
  TimelineEntry,
  'title' | 'text' | 'benchNote' | 'used' | 'temperature' | 'humidity' | 'minutes' | 'expected'
> {
  /** Captions and pins of a sealed entry by photo number; null for a draft. */
  photos: Map<number, { caption: string; pins: TimelinePin[] }> | null;
}

/** Events have no words of their own but a sentence; their titles are fixed. */
const EVENT_TITLES: Record<string, string> = {
  authorisation: 'Estimate authorised',
  close: 'Case closed',
  'handed-back': 'Handed back',
  warranty: 'Warranty issued',
  payment: 'Payment',
  claim: 'Warranty claim',
};

/** The words of a draft. */
export function draftWords(json: string): EntryWords {
  const draft: EntryDraft = EntryDraftSchema.parse(JSON.parse(json));
  return {
    ...draft,
    expected: draft.expected.map(({ photoId, caption }) => ({
      id: photoId,
      caption: caption ?? '',
    })),
    photos: null,
  };
}

const photoWords = ({ n, caption, pins }: PhotoWords) =>
  [n, { caption, pins: pins.map(({ text: note, ...pin }) => ({ ...pin, note })) }] as const;

function bodyWords(body: EntryBody) {
  const { title, text, used, climate } = body;
  return {
    title,
    text,
    used,
    temperature: climate?.temperature.q ?? null,
    humidity: climate?.humidity.q ?? null,
  };
}

const NONE = { text: '', used: [], temperature: null, humidity: null };

/**
 * The words of a sealed entry: from what may be shown, or for the shop's people from what stays in the
 * shop. Words that were erased are gone, and it says so.
 */
export function sealedWords(
  kind: string,
  shown: SealedShown | undefined,
  bench: SealedBench | undefined,
): EntryWords {
  const body = shown?.body ?? bench?.body ?? null;
  const event = EVENT_TITLES[kind];
  const words = body
    ? bodyWords(body)
    : event
      ? { ...NONE, title: event, text: shown?.text ?? '' }
      : { ...NONE, title: 'Erased', text: 'The words of this entry were erased.' };
  return {
    ...words,
    benchNote: bench?.note ?? '',
    minutes: bench?.minutes ?? null,
    expected: [],
    photos: new Map([...(body?.photos ?? []), ...(bench?.photos ?? [])].map(photoWords)),
  };
}
