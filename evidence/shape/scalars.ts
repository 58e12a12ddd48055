import { fromBase64 } from '#evidence/bytes/base64.ts';
import { isInstant } from '#evidence/bytes/instant.ts';
import { z } from '#evidence/shape/zod.ts';

/** A hash or commitment: 32 bytes in lower-case hex. */
export const Hex32Schema = z.string().check(z.regex(/^[0-9a-f]{64}$/));
/** A case or key id: 16 bytes in lower-case hex. */
export const Hex16Schema = z.string().check(z.regex(/^[0-9a-f]{32}$/));
/** `YYYY-MM-DDThh:mm:ss.sssZ`. */
export const InstantSchema = z.string().check(z.refine(isInstant));
/** Padded base64 in canonical form. */
export const Base64Schema = z.string().check(
  z.refine((text) => {
    try {
      return fromBase64(text).length > 0;
    } catch {
      return false;
    }
  }),
);
/** A whole number of at least `least` within 2^53 − 1. */
export const wholeFrom = (least: number) => z.int().check(z.minimum(least));
/** A person as the open parts name one: a role and a number, never a name. */
export const PersonLabelSchema = z
  .string()
  .check(z.regex(/^[a-z]+(?: [a-z]+)* [1-9]\d{0,8}$/), z.maxLength(64));
/** A reading with its unit: the digits as they were read, for example `0.40` mm. */
export const MeasuredSchema = z.strictObject({
  q: z.string().check(z.regex(/^-?\d{1,12}(?:\.\d{1,12})?$/)),
  u: z.string().check(z.minLength(1)),
});
/** The number of a photo in its case. */
export const PhotoNumberSchema = wholeFrom(1);

/** Whether numbers rise from each to the next, so that none comes twice. */
export function rises(numbers: readonly number[]): boolean {
  return numbers.every((number, at) => at === 0 || number > numbers[at - 1]!);
}
