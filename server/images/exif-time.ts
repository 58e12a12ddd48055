/** When a photo was taken, by its own camera: nothing of it is proof, the clock may be wrong. */
export interface TakenTime {
  /** The clock's reading, `2026-03-08T01:59:59` or with `.250`; no zone is implied. */
  clock: string;
  /** `-05:00`, or null when the camera did not say: then the clock time cannot be placed in time. */
  offset: string | null;
  /** The instant, only where the offset is known. */
  at: Date | null;
}

const CLOCK = /^(\d{4})[:-](\d\d)[:-](\d\d)[ T](\d\d):(\d\d):(\d\d)/;
const OFFSET = /^([+-])(\d\d):(\d\d)$/;

const textOf = (value: unknown) =>
  typeof value === 'string' ? value.replace(/\0/g, '').trim() : '';

function minutesOf(offset: string): number | null {
  const [, sign, hours, minutes] = OFFSET.exec(offset) ?? [];
  // The furthest zones are UTC-12:00 and UTC+14:00.
  if (sign === undefined || Number(hours) > 14 || Number(minutes) > 59) return null;
  return (sign === '-' ? -1 : 1) * (Number(hours) * 60 + Number(minutes));
}

/**
 * Reads Exif's clock time (tag 0x9003 or 0x9004), its offset (0x9011 or 0x9012) and its fraction of a
 * second (0x9291 or 0x9292), each as written in the file. Null when there is no such date.
 */
export function takenTime(time: unknown, offset: unknown, fraction: unknown): TakenTime | null {
  const [, ...parts] = CLOCK.exec(textOf(time)) ?? [];
  const [year = '', month = '', day = '', hour = '', minute = '', second = ''] = parts;
  const digits = /^\d+$/.exec(textOf(fraction))?.[0];
  const seconds = `${year}-${month}-${day}T${hour}:${minute}:${second}`;
  const written = digits === undefined ? '' : `.${digits.padEnd(3, '0').slice(0, 3)}`;
  const asUtc = new Date(`${seconds}${written}Z`);
  // The round trip catches what is no date of the calendar, and cameras that were never set.
  if (Number.isNaN(asUtc.getTime()) || !asUtc.toISOString().startsWith(seconds)) return null;

  const zone = textOf(offset);
  const minutes = minutesOf(zone);
  return {
    clock: seconds + written,
    offset: minutes === null ? null : zone,
    at: minutes === null ? null : new Date(asUtc.getTime() - minutes * 60_000),
  };
}
