/** What an entry of a case can be. */
export const CASE_KINDS = [
  'entry',
  'amendment',
  'visibility',
  'authorisation',
  'payment',
  'rest-override',
  'inspection',
  'incident',
  'close',
  'handed-back',
  'warranty',
  'paper',
  'standing',
  'claim',
  'erased',
  'imported',
] as const;
/** What an entry of the log's own chain can be. */
export const LOG_KINDS = ['log-start', 'key', 'stamps', 'clock', 'lost'] as const;
/** The parts an entry can have, each committed to on its own. */
export const PART_NAMES = [
  'shown',
  'owner',
  'bringer',
  'payer',
  'staff',
  'money',
  'bench',
] as const;
/** Kinds that tell a piece of the story and can be amended. */
export const STORY_KINDS = ['entry', 'inspection', 'incident', 'imported'] as const;

export type CaseKind = (typeof CASE_KINDS)[number];
export type LogKind = (typeof LOG_KINDS)[number];
export type Kind = CaseKind | LogKind;
export type PartName = (typeof PART_NAMES)[number];
export type StoryKind = (typeof STORY_KINDS)[number];

/** Whether this program knows the kind, in a case. */
export function isCaseKind(kind: string): kind is CaseKind {
  return (CASE_KINDS as readonly string[]).includes(kind);
}

/** Whether this program knows the kind, in the log's own chain. */
export function isLogKind(kind: string): kind is LogKind {
  return (LOG_KINDS as readonly string[]).includes(kind);
}

/** Whether this program knows the part. */
export function isPartName(name: string): name is PartName {
  return (PART_NAMES as readonly string[]).includes(name);
}

/** Whether entries of this kind tell a piece of the story and can be amended. */
export function isStoryKind(kind: string): kind is StoryKind {
  return (STORY_KINDS as readonly string[]).includes(kind);
}
