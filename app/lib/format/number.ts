const NBSP = '\u00a0';
const MINUS = '\u2212';
const WORDS = 'no one two three four five six seven eight nine ten eleven twelve'.split(' ');

/** A figure with `digits` decimals and a true minus: "0.6", "−2". Zero carries no sign. */
export function decimal(value: number, digits = 0): string {
  const text = Math.abs(value).toFixed(digits);
  return value < 0 && Number(text) !== 0 ? `${MINUS}${text}` : text;
}

/** With its sign always: "+3", "−2", "0". */
export function signed(value: number, digits = 0): string {
  const text = decimal(value, digits);
  return value > 0 && Number(text) !== 0 ? `+${text}` : text;
}

/** "0.6 mm", "62 °C": figure and unit bound by a no-break space. */
export function withUnit(value: number | string, unit: string, digits = 0): string {
  return `${typeof value === 'number' ? decimal(value, digits) : value}${NBSP}${unit}`;
}

/** "41 %"; the value is in percent already. */
export function percent(value: number, digits = 0): string {
  return withUnit(value, '%', digits);
}

/** "eleven"; figures above twelve. */
export function countWord(count: number): string {
  return WORDS[count] ?? String(count);
}

/** "1 entry", "4 entries" */
export function counted(count: number, one: string, many: string): string {
  return `${count}${NBSP}${count === 1 ? one : many}`;
}

/** "Eleven open cases": a count in words at the head of a sentence. */
export function countedInWords(count: number, one: string, many: string): string {
  const text = `${countWord(count)} ${count === 1 ? one : many}`;
  return text.charAt(0).toUpperCase() + text.slice(1);
}
