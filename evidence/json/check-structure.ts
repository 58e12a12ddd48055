import { LimitError, SealedJsonError } from '#evidence/errors.ts';
import { JSON_DEPTH } from '#evidence/limits.ts';

/**
 * Refuses JSON text that nests too deeply or gives one object the same member twice. It runs before
 * `JSON.parse`, which keeps the last of two equal members and says nothing. Text that is not JSON
 * passes or fails here by chance; the parser that runs next refuses it.
 * @throws LimitError deeper than 32; SealedJsonError for a member given twice
 */
export function checkStructure(text: string): void {
  const open: (Set<string> | null)[] = [];
  for (let at = 0; at < text.length; at += 1) {
    const sign = text[at];
    if (sign === '{' || sign === '[') {
      open.push(sign === '{' ? new Set() : null);
      if (open.length > JSON_DEPTH) {
        throw new LimitError(`This JSON nests deeper than ${JSON_DEPTH} levels.`);
      }
    } else if (sign === '}' || sign === ']') {
      open.pop();
    } else if (sign === '"') {
      const end = endOfString(text, at);
      const members = open.at(-1);
      if (members && isMember(text, end)) addMember(members, text.slice(at, end));
      at = end - 1;
    }
  }
}

function endOfString(text: string, start: number): number {
  let at = start + 1;
  while (at < text.length && text[at] !== '"') at += text[at] === '\\' ? 2 : 1;
  return at + 1;
}

function isMember(text: string, end: number): boolean {
  let at = end;
  while (' \t\n\r'.includes(text[at] ?? 'x')) at += 1;
  return text[at] === ':';
}

function addMember(members: Set<string>, quoted: string): void {
  const name = quoted.includes('\\') ? unescape(quoted) : quoted.slice(1, -1);
  if (members.has(name)) throw new SealedJsonError(`This JSON gives "${name}" twice.`);
  members.add(name);
}

function unescape(quoted: string): string {
  try {
    return JSON.parse(quoted) as string;
  } catch {
    throw new SealedJsonError('This is not JSON.');
  }
}
