import { EntryBodySchema, PhotoListSchema } from '#evidence/chain/entry-shown.ts';
import { PersonLabelSchema, wholeFrom } from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

/** Parts owner, bringer, payer: who the person is, and what concerns that person alone. */
export const PartyPartSchema = z.strictObject({
  v: z.literal(1),
  name: z.nullable(z.string()),
  text: z.nullable(z.string()),
});
export type PartyPart = z.output<typeof PartyPartSchema>;

/** Part staff: who stands behind the roles and numbers of the open text. */
export const StaffPartSchema = z.strictObject({
  v: z.literal(1),
  names: z.record(PersonLabelSchema, z.string()),
});
export type StaffPart = z.output<typeof StaffPartSchema>;

/** Part money: an amount in the currency's smallest unit, with its ISO 4217 code. */
export const MoneyPartSchema = z.strictObject({
  v: z.literal(1),
  minor: z.int(),
  cur: z.string().check(z.regex(/^[A-Z]{3}$/)),
});
export type MoneyPart = z.output<typeof MoneyPartSchema>;

/** Part bench, form 1: a note that stays in the shop, and minutes worked. */
export const BenchNoteSchema = z.strictObject({
  v: z.literal(1),
  text: z.string(),
  minutes: z.nullable(wholeFrom(0)),
});
export type BenchNote = z.output<typeof BenchNoteSchema>;

/**
 * Part bench, form 2: besides, the whole of an entry that shows nothing (null in a shared one), and
 * what is said about the bench photos of a shared one.
 */
export const BenchPartSchema = z.strictObject({
  v: z.literal(2),
  text: z.string(),
  minutes: z.nullable(wholeFrom(0)),
  entry: z.nullable(EntryBodySchema),
  photos: PhotoListSchema,
});
export type BenchPart = z.output<typeof BenchPartSchema>;
