/** Any value JSON can hold. Sealed JSON narrows its numbers to whole ones within ±(2^53 − 1). */
export type JsonValue =
  null | boolean | number | string | JsonValue[] | { [member: string]: JsonValue };
