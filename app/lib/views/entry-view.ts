import { restTimes } from '#domain/rest-times.ts';
import type { TimelineEntry, TimelineRest } from '#domain/timeline.ts';
import type { FactView, SealView, TimelineEntryView, UsedView } from '#app/ui/types.ts';
import { clock, dayTime, isSameDay, when } from '../format/date.ts';
import { shortDigest } from '../format/digest.ts';
import { counted, withUnit } from '../format/number.ts';
import { restView } from '../format/rest.ts';
import { span } from '../format/span.ts';
import { photoView } from './photo-view.ts';

/** Who looks, when, and in which zone dates are shown. */
export interface Sight {
  now: Date;
  zone: string;
  /** Where a photo opens in full, by its number. */
  photoHref?: (n: number) => string;
}

const minus = (digits: string) => digits.replace('-', '\u2212');

const hasTimeAhead = (rest: TimelineRest, now: Date) => restTimes(rest).some(({ at }) => at > now);

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

function rested(rest: TimelineRest, zone: string): UsedView {
  const times = restTimes(rest).map(({ name, at }) => `${name} ${dayTime(at, zone)}`);
  return { kind: 'rested', text: `${rest.product}. ${capital(times.join('; '))}` };
}

function climate({ temperature, humidity }: TimelineEntry): string | null {
  const readings = [
    temperature === null ? null : withUnit(minus(temperature), '°C'),
    humidity === null ? null : withUnit(humidity, '%'),
  ].filter((reading) => reading !== null);
  return readings.length === 0 ? null : readings.join(', ');
}

/** How it came in is read off like a table; later the climate is one line among what was used. */
function factsOf(entry: TimelineEntry): FactView[] {
  if (entry.phase !== 'before') return [];
  const { temperature, humidity } = entry;
  return [
    ...(humidity === null
      ? []
      : [{ label: 'Humidity', value: humidity, unit: '%', kind: 'measured' as const }]),
    ...(temperature === null
      ? []
      : [
          {
            label: 'Temperature',
            value: minus(temperature),
            unit: '°C',
            kind: 'measured' as const,
          },
        ]),
  ];
}

function usedOf(entry: TimelineEntry, { now, zone }: Sight): UsedView[] {
  const readings = entry.phase === 'before' ? null : climate(entry);
  return [
    ...(entry.used.length === 0 ? [] : [{ kind: 'used' as const, text: entry.used.join('; ') }]),
    ...(readings === null ? [] : [{ kind: 'bench' as const, text: readings }]),
    ...(entry.rest && !hasTimeAhead(entry.rest, now) ? [rested(entry.rest, zone)] : []),
    ...(entry.minutes === null
      ? []
      : [{ kind: 'hours' as const, text: span(entry.minutes * 60_000) }]),
  ];
}

const firstName = (name: string | null) => (name ?? 'somebody').split(' ')[0];

function openSentence({ expected, photos, writtenBy }: TimelineEntry): string {
  if (expected.length === 0) return 'Not yet sealed.';
  const all = counted(expected.length + photos.length, 'photo', 'photos');
  return `Not yet sealed. ${expected.length} of ${all} still going up from ${firstName(writtenBy)}’s phone.`;
}

/** "09:58" on the day the entry stands under, else with its day. */
function sealedAt(entry: TimelineEntry, at: Date, { zone }: Sight): string {
  const shown = entry.occurredAt ?? entry.writtenAt;
  return isSameDay(at, shown, zone) ? clock(at, zone) : `${dayTime(at, zone)},`;
}

/** What the line below an entry says of its seal; `alone`, away from the entry's date, it has its day too. */
export function sealView(entry: TimelineEntry, sight: Sight, { alone = false } = {}): SealView {
  const { seal } = entry;
  if (seal === null) return { state: 'open', sentence: openSentence(entry) };
  return {
    state: 'sealed',
    when: alone ? `${dayTime(seal.at, sight.zone)},` : sealedAt(entry, seal.at, sight),
    ...(seal.by === null ? { act: 'by the shop' } : { by: seal.by }),
    shortHash: alone ? undefined : shortDigest(seal.leafHash),
  };
}

/** One entry of the timeline, put into words. */
export function entryView(entry: TimelineEntry, sight: Sight): TimelineEntryView {
  const { now, zone, photoHref } = sight;
  const { rest } = entry;
  return {
    id: entry.id,
    phase: entry.phase,
    title: entry.title,
    text: entry.text,
    when: when(entry.occurredAt ?? entry.writtenAt, zone),
    benchOnly: entry.visibility === 'bench' || undefined,
    photos: entry.photos.map((photo) => photoView(photo, photoHref?.(photo.n))),
    facts: factsOf(entry),
    used: usedOf(entry, sight),
    rest:
      rest && hasTimeAhead(rest, now)
        ? restView(
            {
              startedAt: rest.startedAt,
              clampsOff: rest.clampsOffAt,
              mayBeWorked: rest.workedAt,
              mayCarryStrings: rest.stringsAt,
            },
            now,
            zone,
          )
        : undefined,
    seal: sealView(entry, sight),
    corrects: entry.corrects ?? undefined,
  };
}
