import type { TimelineEntry } from '#domain/timeline.ts';

const hours = (from: Date, to: Date | null) =>
  to === null ? '' : String(Math.round((to.getTime() - from.getTime()) / 36_000) / 100);

/** A draft as its form is filled in, by the names of the fields. `clock` puts an instant into the shop's clock. */
export function entryValues(
  entry: TimelineEntry,
  clock: (at: Date) => string,
): Record<string, string> {
  const { rest } = entry;
  return {
    phase: entry.phase,
    visibility: entry.visibility,
    'draft.title': entry.title,
    'draft.text': entry.text,
    'draft.benchNote': entry.benchNote,
    'draft.temperature': entry.temperature ?? '',
    'draft.humidity': entry.humidity ?? '',
    'draft.minutes': entry.minutes === null ? '' : String(entry.minutes),
    'draft.occurredClock': entry.occurredAt === null ? '' : clock(entry.occurredAt).slice(0, 16),
    used: entry.used.join('\n'),
    ...(rest && {
      'draft.rest.product': rest.product,
      'draft.rest.clampsOffHours': hours(rest.startedAt, rest.clampsOffAt),
      'draft.rest.workedHours': hours(rest.startedAt, rest.workedAt),
      'draft.rest.stringsHours': hours(rest.startedAt, rest.stringsAt),
    }),
  };
}
