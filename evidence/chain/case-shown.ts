import { TextShownSchema } from '#evidence/chain/entry-shown.ts';
import { VisibilitySchema } from '#evidence/seal/header.ts';
import { Hex32Schema, PhotoNumberSchema, rises, wholeFrom } from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

const v = z.literal(1);
const numbers = z.array(PhotoNumberSchema).check(z.refine(rises));

/** A close counts the entries it lists, all kinds, and the photos of them all. */
export const CloseShownSchema = z.strictObject({
  v,
  text: z.string(),
  entries: wholeFrom(0),
  photos: wholeFrom(0),
});
/** A warranty: SHA-256 of the ASCII of its credential. */
export const WarrantyShownSchema = z.strictObject({ v, jws: Hex32Schema });
/** A paper: length in bytes and SHA-256 of the whole file. */
export const PaperShownSchema = z.strictObject({ v, length: wholeFrom(1), sha256: Hex32Schema });
/** What was done about a warranty, and why. */
export const StandingShownSchema = z.strictObject({
  v,
  act: z.enum(['suspend', 'resume', 'withdraw', 'replace', 'transfer']),
  reason: z.nullable(z.string()),
});
/** From now on shared or bench only: the photos listed, or all that the entry holds for null. */
export const VisibilityShownSchema = z.strictObject({
  v,
  to: VisibilitySchema,
  n: z.nullable(numbers),
});
/** What was erased of the entries named: parts by name, photos by number. */
export const ErasedShownSchema = z.strictObject({
  v,
  parts: z.array(z.string()),
  photos: numbers,
  reason: z.nullable(z.string()),
});

export type CloseShown = z.output<typeof CloseShownSchema>;
export type WarrantyShown = z.output<typeof WarrantyShownSchema>;
export type PaperShown = z.output<typeof PaperShownSchema>;
export type StandingShown = z.output<typeof StandingShownSchema>;
export type VisibilityShown = z.output<typeof VisibilityShownSchema>;
export type ErasedShown = z.output<typeof ErasedShownSchema>;

/** Shown parts of the kinds of a case that are neither a story nor one of the above. */
export const TEXT_ONLY_KINDS = {
  authorisation: TextShownSchema,
  payment: TextShownSchema,
  'rest-override': TextShownSchema,
  'handed-back': TextShownSchema,
  claim: TextShownSchema,
} as const;
