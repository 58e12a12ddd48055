import type { Finding, FindingData, FindingId, Outcome } from '#evidence/verify/finding.ts';

type Sentence = (data: FindingData) => string;

/**
 * One line of a report in plain words. Every page, file and command that shows a report uses these,
 * so that one finding reads alike everywhere.
 */
export function sentenceOf({ id, outcome, data }: Finding): string {
  const sentence = SENTENCES[id][outcome] ?? FALLBACK[outcome];
  return sentence(data);
}

const MONTHS =
  'January February March April May June July August September October November December';

/** An instant for people: `1 June 2026, 12:00 UTC`; in UTC, because it is read anywhere. */
function moment(instant: FindingData[string] | undefined): string {
  const [, year, month, day, time] =
    /^(\d{4})-(\d\d)-(\d\d)T(\d\d:\d\d)/.exec(String(instant)) ?? [];
  if (day === undefined) return 'a day that is not known';
  return `${Number(day)} ${MONTHS.split(' ')[Number(month) - 1]} ${year}, ${time} UTC`;
}

/** A count with its word, which takes an s for all but one. */
function counted(count: FindingData[string] | undefined, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
const entries = (count: FindingData[string] | undefined) => counted(count, 'entry', 'entries');

const where = ({ chain, seq, position }: FindingData) => {
  if (seq === undefined) return position === undefined ? '' : ` (item ${position} of the file)`;
  return chain === 'log' ? ` (entry ${seq} of the log itself)` : ` (entry ${seq} of the case)`;
};
const why = ({ because }: FindingData) => (because ? `: ${because}` : '');
const failing =
  (what: string): Sentence =>
  (data) =>
    `${what} does not match${where(data)}${why(data)}.`.replace('..', '.');
const unknown =
  (what: string): Sentence =>
  (data) =>
    `${what} could not be checked${where(data)}${why(data)}.`.replace('..', '.');

const FALLBACK: Record<Outcome, Sentence> = {
  checked: () => 'Checked here.',
  failed: failing('Something'),
  'not-checked': unknown('Something'),
  'shop-word': () => 'This is the shop’s word.',
};

const SENTENCES: Record<FindingId, Partial<Record<Outcome, Sentence>>> = {
  bundle: {
    failed: failing('The file'),
    'not-checked': ({ because }) =>
      because === 'not a record of ours'
        ? 'This file is not a record of a witness log.'
        : `This file is of a newer form than can be read here.`,
  },
  'unknown-member': {
    'not-checked': ({ member }) => `The file holds "${member}", which is not known here.`,
  },
  checkpoint: {
    checked: ({ size }) => `The log’s head of ${entries(size)} is signed by the log’s key.`,
    failed: failing('A signed head of the log'),
    'not-checked': unknown('A signed head of the log'),
  },
  inclusion: {
    checked: ({ count }) =>
      `${entries(count)} of this record: every one is in the log under that head.`,
    failed: failing('An entry’s place in the log'),
    'not-checked': unknown('An entry’s place in the log'),
  },
  header: { failed: failing('An entry'), 'not-checked': unknown('An entry') },
  'unknown-kind': {
    'not-checked': (data) =>
      `An entry is of the kind "${data.kind}", not known here${where(data)}.`,
  },
  'own-chain': {
    checked: ({ count }) => `The log’s own chain of ${entries(count)} is whole and open.`,
    failed: failing('The chain of the log’s own entries'),
  },
  'case-chain': {
    checked: ({ first, last }) => `Entries ${first} to ${last} of the case follow one another.`,
    failed: failing('The chain of the case'),
  },
  lost: {
    'not-checked': (data) => `The log says that the contents of an entry are lost${where(data)}.`,
    failed: (data) => `The contents of an entry are missing, and no entry says so${where(data)}.`,
  },
  parts: {
    checked: ({ count }) => `${counted(count, 'part')} opened here: as sealed, every one.`,
    failed: failing('A part of an entry'),
    'not-checked': unknown('A part of an entry'),
  },
  'unknown-part': {
    'not-checked': (data) => `An entry has a part "${data.part}", not known here${where(data)}.`,
  },
  photos: {
    failed: failing('A photo'),
    'not-checked': ({ count }) => `${counted(count, 'picture')} can be compared; none was.`,
  },
  salts: { failed: failing('A salt') },
  order: {
    checked: () => 'Along the log, time never goes back unsaid.',
    failed: failing('The order of the log'),
  },
  names: {
    checked: () => 'Entries name the entries they must name.',
    failed: failing('What an entry names'),
  },
  keys: {
    checked: ({ count }) => `The log lists ${counted(count, 'key')}, each with its use.`,
    failed: failing('A key of the log'),
    'not-checked': unknown('A key of the log'),
  },
  growth: {
    checked: ({ count }) =>
      `${counted(count, 'earlier head')} of the log grew into this one, unchanged.`,
    failed: failing('An earlier head of the log'),
    'not-checked': unknown('An earlier head of the log'),
  },
  stamps: {
    failed: failing('A time-stamp'),
    'not-checked': (data) =>
      data.count
        ? `The record holds ${counted(data.count, 'outside time-stamp')}, not read here yet.`
        : unknown('A time-stamp')(data),
    'shop-word': () => 'No outside time-stamp: when something was sealed is the shop’s word.',
  },
  bracket: {
    'shop-word': ({ count }) =>
      `${entries(count)} not bracketed from below: nothing from outside shows that it was not ` +
      'sealed earlier.',
  },
  warranty: {
    checked: () => 'The warranty is signed by the shop’s credential key and stands in the log.',
    failed: failing('The warranty'),
    'not-checked': unknown('The warranty'),
  },
  standing: {
    failed: failing('The shop’s word on the warranty'),
    'not-checked': unknown('The shop’s word on the warranty'),
    'shop-word': ({ word, at }) =>
      word
        ? `The shop says, signed on ${moment(at)}: ${word}. The record it shows says the same.`
        : 'The record does not say what the warranty is now. Ask for a newer one.',
  },
  'whose-key': {
    checked: ({ key, from, address }) =>
      from === 'address'
        ? `Key ${key}, published at ${address}, leads to this record.`
        : `Key ${key}, known to you from elsewhere, leads to this record.`,
    failed: ({ key }) => `Key ${key}, known from elsewhere, is no log key of this record.`,
    'not-checked': ({ key, because }) =>
      because === 'no key from outside'
        ? `All agrees with key ${key}; nothing here shows whose it is.`
        : `The key known from elsewhere does not lead to key ${key} in this record.`,
  },
  'paper-seal': {
    checked: () => 'The seal value on the paper is this warranty’s.',
    failed: () => 'The seal value on the paper is not this warranty’s.',
    'not-checked': unknown('The seal value on the paper'),
  },
  code: {
    checked: () => 'The code is this warranty’s.',
    failed: () => 'The code is not this warranty’s.',
    'not-checked': unknown('The code'),
  },
  'later-entries': {
    checked: ({ size }) => `Nothing later is in the log up to its head of ${entries(size)}.`,
    failed: failing('The public log'),
    'not-checked': (data) => `The public log was not fully compared${where(data)}${why(data)}.`,
    'shop-word': ({ size }) =>
      `That nothing later is in the log up to its head of ${entries(size)} is the shop’s word.`,
  },
  'kept-back': {
    checked: ({ count, kept, kind, at }) =>
      `${entries(count)}, ${kept} kept by the shop: sealed, not shown; complete up to ` +
      `${kind === 'handed-back' ? 'hand-back' : 'the last one shown'} on ${moment(at)}.`,
  },
};
