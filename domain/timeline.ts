import type { Phase, Visibility } from './entry-draft.ts';
import type { RestFacts } from './rest-times.ts';

/** A numbered mark on a photo; `x` and `y` in ten-thousandths of the upright picture from its top left. */
export interface TimelinePin {
  n: number;
  kind: 'damage' | 'remark';
  x: number;
  y: number;
  label: string;
  note: string;
}

/** A photo as one entry shows it. */
export interface TimelinePhoto {
  id: string;
  /** Its number in the case. */
  n: number;
  visibility: Visibility;
  caption: string;
  state: 'waiting' | 'ready' | 'failed';
  /** Why it failed, in words. */
  failedBecause: string | null;
  /** Upright size of the original, px. */
  width: number;
  height: number;
  /** ThumbHash, base64. */
  placeholder: string | null;
  pins: TimelinePin[];
}

/** A photo the form named that is not up yet. */
export interface ExpectedPhoto {
  id: string;
  caption: string;
}

/** A rest with what rests. */
export interface TimelineRest extends RestFacts {
  product: string;
}

/** How an entry is sealed. */
export interface TimelineSeal {
  at: Date;
  /** Name of whoever sealed it; for a customer too. Null when the owner's act sealed it. */
  by: string | null;
  /** Leaf hash of the entry, 64 hex digits. */
  leafHash: string;
}

/** One entry of a case's timeline. For a customer only what is sealed and shared. */
export interface TimelineEntry {
  id: string;
  kind: string;
  phase: Phase;
  visibility: Visibility;
  title: string;
  text: string;
  /** For the shop's people only: "" for a customer. */
  benchNote: string;
  used: string[];
  /** Digits as read, °C and percent. */
  temperature: string | null;
  humidity: string | null;
  /** Minutes worked; null for a customer. */
  minutes: number | null;
  /** When it happened, if that was said; order is by `writtenAt`. */
  occurredAt: Date | null;
  writtenAt: Date;
  /** Name of who wrote it; null for a customer and for events. */
  writtenBy: string | null;
  writtenById: string | null;
  /** The entry it corrects. */
  corrects: { id: string; title: string } | null;
  rest: TimelineRest | null;
  photos: TimelinePhoto[];
  expected: ExpectedPhoto[];
  /** Null: not yet sealed. */
  seal: TimelineSeal | null;
}
