/** `text` as a LIKE pattern that matches it anywhere, its own wildcards taken literally. */
export function contains(text: string): string {
  return `%${escaped(text)}%`;
}

/** `text` as a LIKE pattern that matches what begins with it. */
export function beginsWith(text: string): string {
  return `${escaped(text)}%`;
}

const escaped = (text: string) => text.replace(/[\\%_]/g, (sign) => `\\${sign}`);
