import { LimitError, SealedJsonError } from '#evidence/errors.ts';
import { checkStructure } from '#evidence/json/check-structure.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';

/**
 * Reads JSON text (RFC 8259) that need not be canonical: a bundle, or the inside of a JWS.
 * @param maxLength most UTF-16 units the text may have; no UTF-8 form of it is shorter
 * @throws LimitError too long or deeper than 32; SealedJsonError not JSON, or a member given twice
 */
export function readJson(text: string, maxLength: number): JsonValue {
  if (text.length > maxLength) {
    throw new LimitError(`This JSON is longer than the ${maxLength} bytes allowed.`);
  }
  checkStructure(text);
  try {
    return JSON.parse(text) as JsonValue;
  } catch {
    throw new SealedJsonError('This is not JSON.');
  }
}
