import { calendarDate, day, isSameDay, shortDay, todayOr } from '#app/lib/format/date.ts';
import { moneyOf } from '#app/lib/views/money-of.ts';
import { restNextView } from '#app/lib/format/rest.ts';
import { thumbView } from '#app/lib/views/photo-view.ts';
import type { RackTagView, RailView, RestNextView } from '#app/ui/types.ts';
import type { CaseState } from '#domain/case-state.ts';
import { kindInSentence } from '#domain/instrument-kinds.ts';
import type { RackCase } from '#server/cases/list-rack.ts';

interface Sight {
  now: Date;
  zone: string;
}

const firstName = (name: string) => name.split(' ')[0] ?? name;

/** What the case waits for: one line, and its colour. */
interface Waits {
  text: string;
  tone: RackTagView['tone'];
  rest?: RestNextView;
}

function resting({ state }: RackCase, { now, zone }: Sight): Waits {
  const rest = state.next && {
    startedAt: state.next.rest.startedAt,
    clampsOff: state.next.rest.clampsOffAt,
    mayBeWorked: state.next.rest.workedAt,
    mayCarryStrings: state.next.rest.stringsAt,
  };
  const view = rest ? restNextView(rest, now, zone) : null;
  return { text: view?.headline ?? 'Resting', tone: 'waiting', rest: view ?? undefined };
}

const OVER = {
  'clamps off': 'Clamps may come off now',
  'may be worked': 'May be worked now',
  'may carry strings': 'May carry strings now',
};

function onTheBench({ state, nextStep }: RackCase): Waits {
  if (state.over) return { text: OVER[state.over.name], tone: 'plain' };
  const step = nextStep === null ? null : kindInSentence(nextStep);
  return { text: step === null ? 'Next: not yet set' : `Next: ${step}`, tone: 'plain' };
}

function waitingForOwner({ estimate, onHold }: RackCase, { now, zone }: Sight): Waits {
  if (onHold !== null || !estimate) return { text: 'Proof of ownership', tone: 'waiting' };
  const sent = isSameDay(estimate.sentAt, now, zone) ? 'today' : day(estimate.sentAt, zone);
  const total = moneyOf(estimate);
  return { text: `${total}, sent ${sent}`, tone: 'waiting' };
}

function readyToGoHome({ closedAt, closedBy }: RackCase, { zone }: Sight): Waits {
  const by = closedBy === null ? '' : ` by ${firstName(closedBy)}`;
  return { text: `Closed ${closedAt ? shortDay(closedAt, zone) : ''}${by}`, tone: 'sealed' };
}

const waits: Record<CaseState, (one: RackCase, sight: Sight) => Waits> = {
  bench: onTheBench,
  rest: resting,
  owner: waitingForOwner,
  home: readyToGoHome,
  'handed back': () => ({ text: 'Handed back', tone: 'plain' }),
};

function promisedWords(one: RackCase, { now, zone }: Sight): string {
  if (one.state.state === 'home') {
    return one.ownerToldAt
      ? `Owner told ${todayOr(one.ownerToldAt, now, zone)}`
      : 'Owner not yet told';
  }
  if (one.promisedOn === null)
    return one.state.state === 'owner' ? 'Promised on authorisation' : 'Promised not yet set';
  const promised = calendarDate(one.promisedOn, zone);
  return one.state.state === 'rest'
    ? `Promised ${shortDay(promised, zone).replace(/^\w+ /, '')}`
    : `Promised ${day(promised, zone)}`;
}

function tagView(one: RackCase, sight: Sight): RackTagView {
  const { text, tone, rest } = waits[one.state.state](one, sight);
  const state = one.state.state === 'rest' ? 'resting, ' : '';
  return {
    href: `/bench/cases/${one.number}`,
    year: String(one.year),
    number: one.ordinal,
    instrument: one.kind,
    maker: one.maker,
    owner: one.owner,
    photo: one.thumb ? thumbView(one.thumb) : undefined,
    waitsFor: text,
    tone,
    rest,
    promised: promisedWords(one, sight),
    who: one.state.state === 'bench' && one.technician ? firstName(one.technician) : undefined,
    name: `Case ${one.ordinal}, ${kindInSentence(one.kind)}, ${one.maker}, ${state}${kindInSentence(text)}`,
  };
}

const RAILS: [RailView['rail'], CaseState][] = [
  ['bench', 'bench'],
  ['resting', 'rest'],
  ['owner', 'owner'],
  ['home', 'home'],
];

const soonest = (a: RackCase, b: RackCase) =>
  (a.state.next?.at.getTime() ?? 0) - (b.state.next?.at.getTime() ?? 0);
// What may be touched again hangs at the head of the rail.
const overFirst = (a: RackCase, b: RackCase) => Number(!a.state.over) - Number(!b.state.over);

/** The four rails with their tags. `now` is one moment for the whole page. */
export function railsView(cases: RackCase[], sight: Sight): RailView[] {
  return RAILS.map(([rail, state]) => {
    const own = cases.filter((one) => one.state.state === state);
    if (rail === 'resting') own.sort(soonest);
    if (rail === 'bench') own.sort(overFirst);
    return { rail, tags: own.map((one) => tagView(one, sight)) };
  });
}
