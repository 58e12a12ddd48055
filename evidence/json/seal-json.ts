import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { LimitError, SealedJsonError } from '#evidence/errors.ts';
import { canonicalText } from '#evidence/json/canonical-text.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { JSON_DEPTH, PART_BYTES } from '#evidence/limits.ts';

/**
 * Writes a value as sealed JSON: RFC 8785 in UTF-8, every text in Unicode form NFC, whole numbers
 * within ±(2^53 − 1) only. This is the one place where text is normalised; readers never do it.
 * @param value null, booleans, whole numbers, texts, arrays and plain objects of these
 * @param limit most bytes allowed
 * @throws SealedJsonError for anything else (`undefined`, a fraction, a date, two members whose
 *   names are the same after normalising); LimitError when too deep or too long
 */
export function sealJson(value: unknown, limit = PART_BYTES): Uint8Array {
  const bytes = toUtf8(canonicalText(normalise(value, '', 0)));
  if (bytes.length > limit) {
    throw new LimitError(`This takes ${bytes.length} bytes; at most ${limit} can be sealed.`);
  }
  return bytes;
}

function normalise(value: unknown, path: string, depth: number): JsonValue {
  if (value === null || typeof value === 'boolean') return value;
  if (typeof value === 'string') return value.normalize('NFC');
  if (typeof value === 'number' && Number.isSafeInteger(value)) return value;
  if (depth >= JSON_DEPTH) throw new LimitError(`This nests deeper than ${JSON_DEPTH} levels.`);
  if (Array.isArray(value)) {
    return Array.from(value, (item, at) => normalise(item, `${path}/${at}`, depth + 1));
  }
  if (isPlainObject(value)) return normaliseMembers(value, path, depth);
  throw new SealedJsonError(`What stands at "${path}" cannot be sealed.`);
}

function normaliseMembers(value: object, path: string, depth: number): JsonValue {
  const members = new Map<string, JsonValue>();
  for (const [name, member] of Object.entries(value)) {
    const normalised = name.normalize('NFC');
    if (members.has(normalised)) {
      throw new SealedJsonError(`"${path}" has two members named "${normalised}".`);
    }
    members.set(normalised, normalise(member, `${path}/${normalised}`, depth + 1));
  }
  // fromEntries makes own properties even of a member named __proto__.
  return Object.fromEntries(members);
}

function isPlainObject(value: unknown): value is object {
  if (typeof value !== 'object' || value === null) return false;
  const prototype: unknown = Object.getPrototypeOf(value);
  return prototype === Object.prototype || prototype === null;
}
