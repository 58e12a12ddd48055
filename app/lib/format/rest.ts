import type { RestNextView, RestTimeView, RestView } from '../../ui/types.ts';
import { dayTime, isSameDay, clock, weekTime } from './date.ts';
import { toGo } from './span.ts';

const HOUR = 3_600_000;

/** A wait for glue or finish; at least one of the three times is set. */
export interface Rest {
  startedAt: Date;
  clampsOff?: Date | null;
  mayBeWorked?: Date | null;
  mayCarryStrings?: Date | null;
}

interface Stop {
  name: RestTimeView['name'];
  at: Date;
}

function stopsOf(rest: Rest): Stop[] {
  const all: { name: RestTimeView['name']; at: Date | null | undefined }[] = [
    { name: 'Clamps off', at: rest.clampsOff },
    { name: 'May be worked', at: rest.mayBeWorked },
    { name: 'May carry strings', at: rest.mayCarryStrings },
  ];
  return all.filter((stop): stop is Stop => stop.at instanceof Date);
}

const nowWords: Record<RestTimeView['name'], string> = {
  'Clamps off': 'Clamps may come off now',
  'May be worked': 'May be worked now',
  'May carry strings': 'May carry strings now',
};

const hours = (from: Date, to: Date) => (to.getTime() - from.getTime()) / HOUR;
const within = (value: number, most: number) => Math.min(Math.max(value, 0), most);
const rested = (elapsed: number, total: number) =>
  `${Math.floor(elapsed)} of ${Math.round(total)} hours rested`;

/** The whole rest clock with its up to three times, as it stands at `now`. `zone` is the shop's IANA time zone. */
export function restView(rest: Rest, now: Date, zone: string): RestView {
  const stops = stopsOf(rest);
  const last = stops.reduce((a, b) => (b.at > a ? b.at : a), rest.startedAt);
  const total = hours(rest.startedAt, last);
  const elapsed = within(hours(rest.startedAt, now), total);
  const next = [...stops].sort((a, b) => a.at.getTime() - b.at.getTime()).find((s) => s.at > now);
  const passed = [...stops]
    .sort((a, b) => b.at.getTime() - a.at.getTime())
    .find((s) => s.at <= now);
  const marks = [...new Set(stops.map((s) => s.at.getTime()))].sort((a, b) => a - b);
  const stopHours = marks.map((ms) => hours(rest.startedAt, new Date(ms)));
  return {
    sentence: next
      ? `Resting. ${next.name} ${dayTime(next.at, zone)}`
      : nowWords[passed?.name ?? 'May be worked'],
    left: next ? toGo(next.at.getTime() - now.getTime()) : undefined,
    over: !next,
    rule: {
      hours: total,
      elapsed,
      stops: stopHours,
      label: `${rested(elapsed, total)}; stops at ${stopHours.map((h) => Math.round(h)).join(' and ')} hours`,
    },
    ends: [
      { hour: 0, text: weekTime(rest.startedAt, zone) },
      ...marks.map((ms, i) => ({ hour: stopHours[i] ?? 0, text: weekTime(new Date(ms), zone) })),
    ],
    times: stops.map((stop) => ({
      name: stop.name,
      when: weekTime(stop.at, zone),
      hour: hours(rest.startedAt, stop.at),
      state:
        stop.at <= now ? 'passed' : stop.at.getTime() === next?.at.getTime() ? 'next' : 'to-come',
    })),
  };
}

/**
 * The rest up to its next time alone, for Rack, What is next and Portal; null when `rest` has no time
 * at all. When every time has passed, `over` is true and the headline says what may be done now.
 */
export function restNextView(rest: Rest, now: Date, zone: string): RestNextView | null {
  const stops = stopsOf(rest).sort((a, b) => a.at.getTime() - b.at.getTime());
  const latest = stops.at(-1);
  if (!latest) return null;
  const next = stops.find((stop) => stop.at > now);
  const stop = next ?? latest;
  const total = hours(rest.startedAt, stop.at);
  const elapsed = within(hours(rest.startedAt, now), total);
  const moment = isSameDay(stop.at, now, zone)
    ? `today, ${clock(stop.at, zone)}`
    : hours(now, stop.at) < 6 * 24
      ? weekTime(stop.at, zone).replace(' ', ', ')
      : dayTime(stop.at, zone);
  return {
    headline: next ? `${stop.name} ${moment}` : nowWords[stop.name],
    left: next ? toGo(stop.at.getTime() - now.getTime()) : `since ${weekTime(stop.at, zone)}`,
    over: !next,
    rule: { hours: total, elapsed, stops: [], label: rested(elapsed, total) },
    from: weekTime(rest.startedAt, zone),
    to: weekTime(stop.at, zone),
  };
}
