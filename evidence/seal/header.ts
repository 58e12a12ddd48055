import { PHOTOS_PER_ENTRY } from '#evidence/limits.ts';
import {
  Hex16Schema,
  Hex32Schema,
  InstantSchema,
  PhotoNumberSchema,
  rises,
  wholeFrom,
} from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

/** The case id of the log's own chain, hex: sixteen zero bytes, which no case may have. */
export const LOG_CASE = '0'.repeat(32);

/** `shared` may be shown to the owner and whoever the owner lets see; `bench` stays in the shop. */
export const VisibilitySchema = z.enum(['shared', 'bench']);
export type Visibility = z.output<typeof VisibilitySchema>;

/** A photo as a header names it: two commitments, each with a salt of its own. */
const HeaderPhotoSchema = z.strictObject({
  n: PhotoNumberSchema,
  original: Hex32Schema,
  published: Hex32Schema,
  visibility: VisibilitySchema,
});

/** The last time-stamped checkpoint there was when an entry was sealed. */
const AfterSchema = z.strictObject({
  size: wholeFrom(1),
  root: Hex32Schema,
  stamp: Hex32Schema,
});
export type After = z.output<typeof AfterSchema>;

/**
 * Form 1 of a header. Kind and part names are any text here, because an unknown one ends only the
 * rules of that kind or part; `check-header.ts` holds the rules that join the members.
 */
export const HeaderSchema = z.strictObject({
  v: z.literal(1),
  kind: z.string(),
  case: Hex16Schema,
  seq: wholeFrom(0).check(z.maximum(0xffffffff)),
  prev: z.nullable(Hex32Schema),
  recordedAt: InstantSchema,
  occurredAt: z.nullable(InstantSchema),
  parts: z.record(z.string(), Hex32Schema),
  photos: z.array(HeaderPhotoSchema).check(
    z.maxLength(PHOTOS_PER_ENTRY),
    z.refine((photos) => rises(photos.map(({ n }) => n))),
  ),
  names: z.array(Hex32Schema).check(z.refine((names) => new Set(names).size === names.length)),
  after: z.nullable(AfterSchema),
  visibility: VisibilitySchema,
});
export type Header = z.output<typeof HeaderSchema>;
