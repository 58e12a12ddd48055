import { z } from 'zod';
import { Invalid } from './errors.ts';

// Control and direction characters hide in pasted text; a line break is the only one that means
// something. Categories Cc and Zl, Zp, and the marks that turn the direction of what follows.
const HIDDEN = /(?!\n)[\p{Cc}\p{Zl}\p{Zp}\u202a-\u202e\u2066-\u2069\ufeff]/gu;

const tidy = (text: string) =>
  text.normalize('NFC').replace(/\r\n?/g, '\n').replace(/\t/g, ' ').replace(HIDDEN, '').trim();

const lengthOf = (text: string) => [...text].length;

/**
 * Text of at most `most` characters, tidied: NFC, without control characters, one kind of line break.
 * `what` begins the sentence: "The serial".
 */
export function text(what: string, most: number) {
  return z
    .string()
    .nullish()
    .transform((value) => tidy(value ?? ''))
    .superRefine((value, context) => {
      const length = lengthOf(value);
      if (length > most)
        context.addIssue({
          code: 'custom',
          message: `${what} has ${length} characters; ${most} is the most. Shorten it.`,
        });
    });
}

/** As `text`, on one line and never empty: `missing` is the sentence for nothing at all. */
export function neededText(what: string, most: number, missing: string) {
  return oneLine(text(what, most)).refine((value) => value !== '', missing);
}

/** As `text`, on one line; null when empty. */
export function optionalText(what: string, most: number) {
  return oneLine(text(what, most)).transform((value) => (value === '' ? null : value));
}

const oneLine = (schema: ReturnType<typeof text>) =>
  schema.transform((value) => value.replace(/\s+/g, ' '));

/** A tick box of a form: present is true. */
export const ticked = z
  .union([z.boolean(), z.string()])
  .optional()
  .transform((value) => value === true || value === 'on' || value === 'true');

/**
 * Reads `input` by `schema`. Throws Invalid with one sentence per wrong field, named by its path
 * ("owner.email"), the first wrong field first.
 */
export function parseInput<Schema extends z.ZodType>(
  schema: Schema,
  input: unknown,
): z.output<Schema> {
  const result = schema.safeParse(input);
  if (result.success) return result.data;
  const fields: Record<string, string> = {};
  for (const { path, message } of result.error.issues) fields[path.join('.')] ??= message;
  throw new Invalid(fields);
}
