import { equal } from '#evidence/bytes/equal.ts';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { LimitError, SealedJsonError } from '#evidence/errors.ts';
import { canonicalText } from '#evidence/json/canonical-text.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { readJson } from '#evidence/json/read-json.ts';
import { PART_BYTES } from '#evidence/limits.ts';

/**
 * Reads sealed JSON and refuses bytes that are not their own canonical form: other spacing, order
 * or escapes, a member given twice, a fraction, a byte order mark.
 * @param limit most bytes allowed
 * @throws LimitError too long or deeper than 32; EncodingError not UTF-8; SealedJsonError otherwise
 */
export function readSealedJson(bytes: Uint8Array, limit = PART_BYTES): JsonValue {
  if (bytes.length > limit) {
    throw new LimitError(`This is ${bytes.length} bytes long; at most ${limit} are allowed.`);
  }
  const value = readJson(fromUtf8(bytes), limit);
  refuseFractions(value);
  if (!equal(toUtf8(canonicalText(value)), bytes)) {
    throw new SealedJsonError('These bytes are JSON, but not in canonical form.');
  }
  return value;
}

function refuseFractions(value: JsonValue): void {
  if (typeof value === 'number' && !Number.isSafeInteger(value)) {
    throw new SealedJsonError('Sealed JSON holds whole numbers within ±(2^53 − 1) only.');
  }
  if (typeof value === 'object' && value !== null) Object.values(value).forEach(refuseFractions);
}
