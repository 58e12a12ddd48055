import { calendarDate, dateOnly, day, dayTime } from '#app/lib/format/date.ts';
import { moneyOf } from '#app/lib/views/money-of.ts';
import { counted } from '#app/lib/format/number.ts';
import { restNextView } from '#app/lib/format/rest.ts';
import type { Sight } from '#app/lib/views/entry-view.ts';
import type { CaseTagView, WhatIsNextView } from '#app/ui/types.ts';
import { CASE_STATE_WORDS } from '#domain/case-state.ts';
import { kindInSentence } from '#domain/instrument-kinds.ts';
import { restTimes } from '#domain/rest-times.ts';
import type { TimelineEntry } from '#domain/timeline.ts';
import type { CaseFile } from '#server/cases/get-case.ts';

const model = ({ maker, model: name }: CaseFile) => (name === null ? maker : `${maker}, ${name}`);

/** The tag of a case file. */
export function caseTagView(file: CaseFile, { zone }: Sight): CaseTagView {
  return {
    year: String(file.year),
    number: file.ordinal,
    instrument: file.kind,
    maker: model(file),
    serial: file.serial ?? undefined,
    owner: file.owner,
    takenIn: day(file.takenInAt, zone),
    promised: file.promisedOn ? day(calendarDate(file.promisedOn, zone), zone) : 'not yet set',
    complaint: file.job,
  };
}

/** "Case file 2026-031, parlour guitar by Aldous Pike" */
export const caseHeading = ({ number, kind, maker }: CaseFile) =>
  `Case file ${number}, ${kindInSentence(kind)} by ${maker}`;

function restPart({ state, rests }: CaseFile, { now, zone }: Sight) {
  const { next } = state;
  const rest = next && rests.find(({ startedAt }) => startedAt === next.rest.startedAt);
  if (!next || !rest) return {};
  const view = restNextView(
    {
      startedAt: rest.startedAt,
      clampsOff: rest.clampsOffAt,
      mayBeWorked: rest.workedAt,
      mayCarryStrings: rest.stringsAt,
    },
    now,
    zone,
  );
  const last = restTimes(rest).at(-1);
  const later =
    last && last.at > next.at
      ? ` ${last.name.charAt(0).toUpperCase()}${last.name.slice(1)} ${dayTime(last.at, zone)}.`
      : '';
  return { rest: view ?? undefined, restNote: `${rest.product}.${later}` };
}

const OVER = {
  'clamps off': 'Clamps may come off now',
  'may be worked': 'May be worked now',
  'may carry strings': 'May carry strings now',
};

function headline({ state, onHold, estimate }: CaseFile): WhatIsNextView['headline'] {
  if (state.next) return undefined;
  if (state.over) return { text: OVER[state.over.name], tone: 'plain' };
  const text = CASE_STATE_WORDS[state.state];
  if (state.state === 'owner') {
    const why = onHold !== null ? 'proof of ownership' : 'the estimate';
    return { text: `${text}: ${estimate || onHold !== null ? why : ''}`, tone: 'waiting' };
  }
  return { text, tone: state.state === 'bench' ? 'plain' : 'sealed' };
}

function steps(file: CaseFile, drafts: number): string[] {
  if (file.handedBackAt) return [];
  if (file.closedAt)
    return [
      ...(file.ownerToldAt ? [] : ['Tell the owner']),
      'Issue the warranty, if it has none yet',
      'Hand it back',
    ];
  return [
    ...(file.nextStep === null ? [] : [file.nextStep]),
    ...(drafts === 0 ? [] : [`Seal ${counted(drafts, 'entry', 'entries')}`]),
    'Close the case, issue the warranty',
  ];
}

function estimateFact({ estimate }: CaseFile, { zone }: Sight) {
  if (!estimate) return [];
  const { answer, answeredAt, sentAt, revision } = estimate;
  const when = answer && answeredAt ? `${answer} ${dateOnly(answeredAt, zone)}` : null;
  const note = `with tax, revision ${revision}; ${when ?? `sent ${dateOnly(sentAt, zone)}, not yet answered`}`;
  return [{ label: 'Estimate', value: moneyOf(estimate), note }];
}

function portalFact(timeline: TimelineEntry[]) {
  const shown = timeline.filter(({ seal, visibility }) => seal && visibility === 'shared').length;
  const note =
    shown === 0
      ? 'nothing is sealed yet'
      : `shows ${counted(shown, 'sealed entry', 'sealed entries')}`;
  return { label: 'Portal', value: 'Open to the owner', note };
}

/** What the case waits for, the steps that are left, and what else is to be known. */
export function whatIsNextView(
  file: CaseFile,
  timeline: TimelineEntry[],
  sight: Sight,
): WhatIsNextView {
  const drafts = timeline.filter(({ seal }) => seal === null).length;
  const has = file.technician === null ? [] : [{ label: 'Who has it', value: file.technician }];
  const place = file.place === null ? [] : [{ label: 'Hangs at', value: file.place }];
  return {
    ...restPart(file, sight),
    headline: headline(file),
    steps: steps(file, drafts),
    facts: [...estimateFact(file, sight), portalFact(timeline), ...has, ...place],
  };
}

/** How the photos of the drafts are doing: "All photos are up". */
export function photosStatus(timeline: TimelineEntry[]): string {
  const missing = timeline.reduce((sum, { expected }) => sum + expected.length, 0);
  if (missing === 0) return 'All photos are up';
  return missing === 1 ? 'All but 1 photo is up' : `All but ${missing} photos are up`;
}
