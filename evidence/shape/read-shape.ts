import { ShapeError, UnknownFormError } from '#evidence/errors.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { z } from '#evidence/shape/zod.ts';

/**
 * Holds a value against a schema.
 * @param what the value's name in a sentence, for example "header"
 * @throws ShapeError naming the first place where the two differ
 */
export function readShape<Schema extends z.ZodMiniType>(
  schema: Schema,
  value: unknown,
  what: string,
): z.output<Schema> {
  const result = z.safeParse(schema, value);
  if (result.success) return result.data;
  const path = result.error.issues[0]?.path.join('.') ?? '';
  const where = path === '' ? 'as a whole' : `at "${path}"`;
  throw new ShapeError(`The ${what} is not what its form prescribes ${where}.`, path);
}

/**
 * The `v` of a value, read before anything else: what an unknown `v` means is not known either.
 * @throws ShapeError when the value is no object or has no whole number `v`
 */
export function readVersion(value: JsonValue | undefined, what: string): number {
  const v = typeof value === 'object' && value !== null && !Array.isArray(value) ? value.v : null;
  if (typeof v !== 'number' || !Number.isSafeInteger(v)) {
    throw new ShapeError(`The ${what} does not say which form it has.`, 'v');
  }
  return v;
}

/** The error for a form, kind or name from a program newer than this one. */
export function unknownForm(what: string): UnknownFormError {
  return new UnknownFormError(`${what} is not known to this program. A newer one may know it.`);
}
