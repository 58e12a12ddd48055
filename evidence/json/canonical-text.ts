import canonicalize from 'canonicalize';
import { SealedJsonError } from '#evidence/errors.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';

/**
 * RFC 8785 text of a JSON value.
 * @throws SealedJsonError for a string with half a surrogate pair, which RFC 8785 forbids
 */
export function canonicalText(value: JsonValue): string {
  try {
    return canonicalize(value)!;
  } catch (cause) {
    throw new SealedJsonError('This value has no canonical form.', { cause });
  }
}
