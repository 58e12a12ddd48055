import {
  calendarDate,
  clock,
  dateOnly,
  isSameDay,
  longDay,
  todayOr,
  weekTime,
} from '#app/lib/format/date.ts';
import { moneyOf } from '#app/lib/views/money-of.ts';
import { restNextView } from '#app/lib/format/rest.ts';
import type { PortalNowView, StationView } from '#app/ui/types.ts';
import { CASE_STATE_WORDS } from '#domain/case-state.ts';
import type { RestTimeName } from '#domain/rest-times.ts';
import type { TimelineEntry } from '#domain/timeline.ts';
import type { OwnCase } from '#server/cases/read-own-cases.ts';

interface Sight {
  now: Date;
  zone: string;
}

/** A sentence and the part of it that is printed heavier. */
type Said = Pick<PortalNowView, 'sentence' | 'stress'>;

const RESTING: Record<RestTimeName, (when: string) => string> = {
  'clamps off': (when) => `It rests under clamps. They come off ${when}.`,
  'may be worked': (when) => `It rests, and nothing is done to it. Work goes on ${when}.`,
  'may carry strings': (when) => `It rests. It may carry strings ${when}.`,
};

const SIX_DAYS = 6 * 24 * 3_600_000;

/** "on Thursday at 09:40", "today at 16:10", "on Monday 4 May at 08:00" once the weekday is not enough. */
function moment(at: Date, { now, zone }: Sight): string {
  const near = at.getTime() - now.getTime() < SIX_DAYS;
  const day = longDay(at, zone);
  const said = isSameDay(at, now, zone) ? 'today' : `on ${near ? day.split(' ')[0] : day}`;
  return `${said} at ${clock(at, zone)}`;
}

function said(own: OwnCase, sight: Sight): Said {
  const { state, closedAt, handedBackAt, asksForProof } = own;
  switch (state.state) {
    case 'rest': {
      const when = state.next ? moment(state.next.at, sight) : '';
      const sentence = state.next ? RESTING[state.next.name](when) : 'It rests.';
      return { sentence, stress: when.replace(/^on /, '') };
    }
    case 'owner':
      return {
        sentence: asksForProof
          ? 'Before work begins we ask for papers that show whose it is. Bring them, or write to us.'
          : 'We have sent you an estimate. Work on it waits for your answer.',
      };
    case 'home':
      return {
        sentence: 'The work is done and the case is closed. Come and fetch it when you like.',
      };
    case 'handed back':
      return {
        sentence: handedBackAt
          ? `It went home ${longDay(handedBackAt, sight.zone)}.`
          : 'It went home.',
      };
    case 'bench':
      return {
        sentence: closedAt ? 'It is looked after.' : 'It is on the bench and is worked on.',
      };
  }
}

function since({ state, closedAt }: OwnCase, { now, zone }: Sight): string | undefined {
  if (state.state === 'rest' && state.next)
    return `since ${todayOr(state.next.rest.startedAt, now, zone)}`;
  if (state.state === 'home' && closedAt) return `since ${longDay(closedAt, zone)}`;
  return undefined;
}

const tones = {
  bench: 'plain',
  rest: 'waiting',
  owner: 'waiting',
  home: 'sealed',
  'handed back': 'plain',
} as const;

/** Where one of the owner's instruments is now, in one word and one sentence. */
export function nowView(own: OwnCase, sight: Sight): PortalNowView {
  const { state, promisedOn, closedAt, estimate, number } = own;
  const { zone, now } = sight;
  const rest = state.next && {
    startedAt: state.next.rest.startedAt,
    clampsOff: state.next.rest.clampsOffAt,
    mayBeWorked: state.next.rest.workedAt,
    mayCarryStrings: state.next.rest.stringsAt,
  };
  const ready =
    closedAt || !promisedOn
      ? []
      : [{ label: 'May be ready', value: longDay(calendarDate(promisedOn, zone), zone) }];
  const agreed =
    estimate?.answer === 'authorised'
      ? [{ label: 'You authorised', value: moneyOf(estimate) }]
      : [];
  return {
    state: CASE_STATE_WORDS[state.state].replace('the owner', 'you'),
    tone: tones[state.state],
    since: since(own, sight),
    ...said(own, sight),
    rest: (rest && restNextView(rest, now, zone)) ?? undefined,
    rows: [...ready, ...agreed, { label: 'Case', value: number }],
  };
}

/** Where it has been, where it is, what is to come; dates only of what the owner may know. */
export function stationsView(
  own: OwnCase,
  timeline: TimelineEntry[],
  { zone }: Sight,
): StationView[] {
  const { state, takenInAt, estimate, promisedOn, closedAt, handedBackAt } = own;
  const work = timeline.find(({ phase, kind }) => phase === 'during' && kind !== 'authorisation');
  const date = (at: Date) => dateOnly(at, zone);
  const stations: StationView[] = [{ label: 'Taken in', when: date(takenInAt), state: 'done' }];
  if (estimate?.answer === 'authorised' && estimate.answeredAt)
    stations.push({
      label: 'You authorised the estimate',
      when: date(estimate.answeredAt),
      state: 'done',
    });
  if (state.state === 'owner')
    stations.push({ label: 'Waiting for you', when: 'now', state: 'here' });
  const begun = work ? date(work.occurredAt ?? work.writtenAt) : null;
  if (state.state === 'bench')
    stations.push({ label: 'On the bench now', when: begun ?? 'now', state: 'here' });
  else if (begun !== null) stations.push({ label: 'On the bench', when: begun, state: 'done' });
  if (state.state === 'rest' && state.next)
    stations.push({
      label: 'Resting now',
      when: `until ${weekTime(state.next.at, zone)}`,
      state: 'here',
    });
  const promised = promisedOn ? date(calendarDate(promisedOn, zone)) : 'to come';
  stations.push({
    label: 'Ready to go home',
    when: closedAt ? date(closedAt) : promised,
    state: handedBackAt ? 'done' : closedAt ? 'here' : 'to-come',
  });
  if (handedBackAt)
    stations.push({ label: 'Handed back', when: date(handedBackAt), state: 'done' });
  return stations;
}
