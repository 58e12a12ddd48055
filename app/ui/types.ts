/**
 * What the components show, as plain values: every date, number and sentence is already put into
 * words in the shop's time zone (#app/lib/format), so that the server's and the browser's text are
 * the same to the letter.
 */

export type Phase = 'before' | 'during' | 'after';

/** The three states of the witness mark. Words stand beside it, always. */
export type MarkState = 'aligned' | 'hollow' | 'displaced';

/** A moment: `iso` for machines, the rest for people. */
export interface WhenView {
  iso: string;
  /** "Mon 30 Mar" */
  date: string;
  /** "10:12" */
  time: string;
  /** "time zone unknown", when the camera's clock did not say. */
  caution?: string;
}

/** A numbered mark on a photo; `x` and `y` in percent of the upright picture, from its top left. */
export interface PinView {
  n: number;
  kind: 'damage' | 'remark';
  x: number;
  y: number;
  /** "Back edge lifted." */
  title: string;
  /** "Open from the middle to the treble wing." */
  text: string;
}

export interface PhotoView {
  id: string;
  n: number;
  /** What it shows, under the picture. */
  caption: string;
  /** What is to be seen and where; never "photo of". */
  alt: string;
  /** ready: the three sizes exist. preparing: the original is kept, the sizes are being made. missing: see `note`. */
  state: 'ready' | 'preparing' | 'missing';
  /** Stands in the empty window: "Photo 16 is still on Tomasz’s phone." */
  note?: string;
  src320: string;
  src960: string;
  src2048: string;
  /** Size in px of the largest derivative, upright. */
  width: number;
  height: number;
  /** A few pixels as a data URL, shown until the picture is there. */
  placeholder?: string;
  pins: PinView[];
  /** Opens the photo in the viewer. */
  href?: string;
}

/** A small picture: Rack tag, film, strip, list of photos going up. */
export interface ThumbView {
  src: string;
  width: number;
  height: number;
  placeholder?: string;
  alt?: string;
}

/** One of the up to three times of a rest. */
export interface RestTimeView {
  name: 'Clamps off' | 'May be worked' | 'May carry strings';
  /** "Thu 09:40" */
  when: string;
  state: 'passed' | 'next' | 'to-come';
  /** Hours from the start of the rest. */
  hour: number;
}

/** The rule: how long it is, how much has gone by, where it stops. */
export interface RestRuleView {
  /** Length of the rule in hours. */
  hours: number;
  /** Hours gone by, from 0 to `hours`. */
  elapsed: number;
  /** Hours at which the rule carries a stop; empty when only its end matters. */
  stops: number[];
  /** "4 of 24 hours rested" */
  label: string;
}

export interface RestView {
  /** "Resting. Clamps off Thu 16 April, 09:40", "Clamps may come off now" */
  sentence: string;
  /** "19 h 35 min to go"; undefined when over. */
  left?: string;
  over: boolean;
  rule: RestRuleView;
  /** Labels under the rule, from its start to its end: { hour: 0, text: "Wed 09:40" }. */
  ends: { hour: number; text: string }[];
  times: RestTimeView[];
}

/** A rest where only its next time matters: Rack, What is next, Portal. */
export interface RestNextView {
  /** "Clamps off Thu, 09:40" */
  headline: string;
  /** "19 h 35 min to go" */
  left: string;
  over: boolean;
  rule: RestRuleView;
  /** "Wed 09:40" */
  from: string;
  /** "Thu 09:40" */
  to: string;
}

export type SealView =
  /** `by` a person, or `act` of the owner ("on the owner’s authorisation"). */
  | { state: 'sealed'; when: string; by?: string; act?: string; shortHash?: string }
  /** "Not yet sealed. 1 of 3 photos still going up from Tomasz’s phone." */
  | { state: 'open'; sentence: string }
  | { state: 'altered'; sentence: string };

export interface UsedView {
  kind: 'used' | 'bench' | 'into-tray' | 'out-of-tray' | 'rested' | 'kept-at' | 'hours';
  text: string;
}

/** A measurement or a fact worth a line of its own. */
export interface FactView {
  label: string;
  /** "0.6", "Hard case, strap" */
  value: string;
  unit?: string;
  /** measured upright, worked-out italic, words in the sans. */
  kind: 'measured' | 'worked-out' | 'words';
}

export interface TimelineEntryView {
  id: string;
  phase: Phase;
  title: string;
  /** The note; an empty line begins a new paragraph. */
  text: string;
  when: WhenView;
  /** Said on the bench only: the portal never gets such an entry. */
  benchOnly?: boolean;
  photos: PhotoView[];
  facts: FactView[];
  used: UsedView[];
  rest?: RestView;
  seal: SealView;
  /** The entry that this one corrects. */
  corrects?: { id: string; title: string };
}

export interface PhaseView {
  phase: Phase;
  /** "How it came in. 4 entries, 6 photos.", "Nothing here yet." */
  sub: string;
  entries: TimelineEntryView[];
  /** What fills it, when it has no entries. */
  empty?: string;
}

export interface CaseTagView {
  /** "2026" */
  year: string;
  /** "031" */
  number: string;
  instrument: string;
  maker?: string;
  serial?: string;
  owner: string;
  takenIn: string;
  /** "Fri 24 April", "not yet set" */
  promised: string;
  /** The complaint, short. */
  complaint: string;
}

export interface RackTagView {
  href: string;
  year: string;
  number: string;
  instrument: string;
  maker?: string;
  owner: string;
  photo?: ThumbView;
  /** What it waits for: "Next: level the new frets", "Clamps off Thu, 09:40", "Closed Tue 14 Apr by Ines". */
  waitsFor: string;
  tone: 'plain' | 'waiting' | 'sealed';
  rest?: RestNextView;
  /** "Promised Wed 22 April" */
  promised: string;
  /** First name of who has it. */
  who?: string;
  /** "Case 031, parlour guitar, Aldous Pike, resting, clamps off Thu 09:40" */
  name: string;
}

export interface RailView {
  rail: 'bench' | 'resting' | 'owner' | 'home';
  tags: RackTagView[];
}

export interface WhatIsNextView {
  rest?: RestNextView;
  /** Under the rest: "Bridge, hot hide glue. May carry strings Fri 17 April, 09:40." */
  restNote?: string;
  /** When nothing rests: "On the bench", "Waiting for the owner". */
  headline?: { text: string; tone: 'plain' | 'waiting' | 'sealed' };
  steps: string[];
  facts: { label: string; value: string; note?: string }[];
}

/** One photo on its way to the shop's store. */
export interface GoingUpView {
  id: string;
  /** "Photo 13", or the file's name before it has a number. */
  name: string;
  thumb?: string;
  /** 0 to 100 */
  percent: number;
  state: 'waiting' | 'going-up' | 'up' | 'kept' | 'failed';
  /** For a failed one: what is wrong, then what to do. */
  reason?: string;
  /** A refused file is not tried again. */
  final?: boolean;
}

export interface PortalNowView {
  /** "Resting" */
  state: string;
  tone: 'plain' | 'waiting' | 'sealed';
  /** "since today, 09:40" */
  since?: string;
  sentence: string;
  /** The part of `sentence` that is printed heavier: "Thursday at 09:40". */
  stress?: string;
  rest?: RestNextView;
  /** "May be ready", "Friday 24 April" */
  rows: { label: string; value: string }[];
}

export interface StationView {
  label: string;
  when: string;
  state: 'done' | 'here' | 'to-come';
}

export interface PortalCaseLinkView {
  href: string;
  instrument: string;
  maker?: string;
  /** "2026-031" */
  number: string;
  photo?: ThumbView;
  state: string;
  tone: 'plain' | 'waiting' | 'sealed';
  sentence: string;
}

export type VerdictKind = 'intact' | 'does-not-match' | 'not-known' | 'not-fully-checked';

export interface StandingView {
  word: 'In force' | 'Ended' | 'Suspended' | 'Withdrawn' | 'Replaced';
  /** "Standing, the shop’s word" unless said otherwise. */
  label?: string;
  /** "To 24 April 2028." */
  date: string;
  /** "Signed by the shop today, 14:05. It may change; what was checked cannot." */
  small: string;
}

export interface CheckRowView {
  /** What is held: "Warranty number". */
  held: string;
  heldNote?: string;
  /** A value in the mono face; an array stands on lines of its own. */
  heldCode?: string | string[];
  result: 'good' | 'bad' | 'open';
  /** "Known", "Good", "Matches", "Compare", "Not downloaded" */
  word: string;
  note?: string;
  noteCode?: string;
}

/** A photo in the viewer, with what is known about it. */
export interface ViewerPhotoView extends PhotoView {
  phase: Phase;
  /** "Tue 31 March, 09:31" */
  when: string;
  /** "Tomasz Rell, workshop phone" */
  takenBy?: string;
  /** 64 hex digits of the original. */
  sha256?: string;
  /** "Sealed 31 March, 09:58, by Tomasz Rell", or why it is not. */
  seal: { state: SealView['state']; lead: string; text?: string };
}
