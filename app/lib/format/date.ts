import type { WhenView } from '../../ui/types.ts';

const DAYS = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];
const MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

interface Parts {
  weekday: string;
  day: number;
  month: string;
  year: number;
  clock: string;
}

const formats = new Map<string, Intl.DateTimeFormat>();

/** Only figures are asked of Intl: names differ between the data of servers and browsers. */
function formatFor(zone: string): Intl.DateTimeFormat {
  let format = formats.get(zone);
  if (!format) {
    format = new Intl.DateTimeFormat('en-GB', {
      timeZone: zone,
      hourCycle: 'h23',
      year: 'numeric',
      month: 'numeric',
      day: 'numeric',
      hour: '2-digit',
      minute: '2-digit',
    });
    formats.set(zone, format);
  }
  return format;
}

function partsOf(date: Date, zone: string): Parts {
  const found: Record<string, string> = {};
  for (const { type, value } of formatFor(zone).formatToParts(date)) found[type] = value;
  const year = Number(found.year);
  const month = Number(found.month) - 1;
  const day = Number(found.day);
  return {
    weekday: DAYS[new Date(Date.UTC(year, month, day)).getUTCDay()] ?? '',
    day,
    month: MONTHS[month] ?? '',
    year,
    clock: `${found.hour}:${found.minute}`,
  };
}

/** "09:40". `zone` is the shop's IANA time zone, here and below; never the machine's own. */
export function clock(date: Date, zone: string): string {
  return partsOf(date, zone).clock;
}

/** "Mon 30 Mar" */
export function shortDay(date: Date, zone: string): string {
  const p = partsOf(date, zone);
  return `${p.weekday.slice(0, 3)} ${p.day} ${p.month.slice(0, 3)}`;
}

/** "Thu 16 April" */
export function day(date: Date, zone: string): string {
  const p = partsOf(date, zone);
  return `${p.weekday.slice(0, 3)} ${p.day} ${p.month}`;
}

/** "Thu 16 April, 09:40" */
export function dayTime(date: Date, zone: string): string {
  return `${day(date, zone)}, ${clock(date, zone)}`;
}

/** "Thu 09:40" */
export function weekTime(date: Date, zone: string): string {
  const p = partsOf(date, zone);
  return `${p.weekday.slice(0, 3)} ${p.clock}`;
}

/** "30 March" */
export function dateOnly(date: Date, zone: string): string {
  const p = partsOf(date, zone);
  return `${p.day} ${p.month}`;
}

/** "Friday 24 April" */
export function longDay(date: Date, zone: string): string {
  const p = partsOf(date, zone);
  return `${p.weekday} ${p.day} ${p.month}`;
}

/** "Wednesday 15 April, 14:05" */
export function longDayTime(date: Date, zone: string): string {
  return `${longDay(date, zone)}, ${clock(date, zone)}`;
}

/** "24 April 2028": with its year, for tag, warranty and Verify. */
export function dateYear(date: Date, zone: string): string {
  const p = partsOf(date, zone);
  return `${p.day} ${p.month} ${p.year}`;
}

/** "24 April 2026, 16:05" */
export function dateYearTime(date: Date, zone: string): string {
  return `${dateYear(date, zone)}, ${clock(date, zone)}`;
}

/** Whether both moments fall on one day in the shop's time zone. */
export function isSameDay(a: Date, b: Date, zone: string): boolean {
  return dateYear(a, zone) === dateYear(b, zone);
}

/** "today, 09:15", or "Mon 13 April, 09:15" on any other day. */
export function todayOr(date: Date, now: Date, zone: string): string {
  return isSameDay(date, now, zone) ? `today, ${clock(date, zone)}` : dayTime(date, zone);
}

/** The date column of the timeline. */
export function when(date: Date, zone: string): WhenView {
  return { iso: date.toISOString(), date: shortDay(date, zone), time: clock(date, zone) };
}

/** A calendar date without a time ("2026-04-24") as a moment that every function above shows as that day in `zone`. */
export function calendarDate(text: string, zone: string): Date {
  const noon = new Date(`${text}T12:00:00Z`);
  const shown = partsOf(noon, zone).day;
  const wanted = noon.getUTCDate();
  // East of +12 noon in Greenwich is already the next day.
  return shown === wanted ? noon : new Date(noon.getTime() - 12 * 3_600_000);
}
