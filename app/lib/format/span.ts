const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;
/** Binds a figure to its unit, so that a line never ends between them. */
const NBSP = '\u00a0';

/**
 * A length of time in ms, in the two largest units that matter: "35 min", "19 h 35 min", "2 d 18 h".
 * Minutes are rounded up: what still rests is never shown as over.
 */
export function span(ms: number): string {
  const minutes = Math.max(0, Math.ceil(ms / MINUTE));
  const rounded = minutes * MINUTE;
  if (rounded < HOUR) return `${minutes}${NBSP}min`;
  if (rounded < 2 * DAY) {
    const rest = minutes % 60;
    const hours = `${Math.floor(minutes / 60)}${NBSP}h`;
    return rest === 0 ? hours : `${hours} ${String(rest).padStart(2, '0')}${NBSP}min`;
  }
  const hours = Math.ceil(minutes / 60);
  const days = `${Math.floor(hours / 24)}${NBSP}d`;
  return hours % 24 === 0 ? days : `${days} ${hours % 24}${NBSP}h`;
}

/** "19 h 35 min to go" */
export function toGo(ms: number): string {
  return `${span(ms)} to go`;
}
