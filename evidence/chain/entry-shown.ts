import {
  InstantSchema,
  MeasuredSchema,
  PersonLabelSchema,
  PhotoNumberSchema,
  rises,
  wholeFrom,
} from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

/** Form 1 of many parts: a text and nothing else. */
export const TextShownSchema = z.strictObject({ v: z.literal(1), text: z.string() });
export type TextShown = z.output<typeof TextShownSchema>;

/** A numbered mark on a photo; x and y are ten-thousandths of its width and height. */
const PinSchema = z.strictObject({
  n: wholeFrom(1),
  x: wholeFrom(0).check(z.maximum(10000)),
  y: wholeFrom(0).check(z.maximum(10000)),
  kind: z.enum(['damage', 'remark']),
  label: z.string(),
  text: z.string(),
});
export type Pin = z.output<typeof PinSchema>;

/** What is said about a photo; `taken` is text: the camera's own words, a zone only if it gave one. */
const PhotoWordsSchema = z.strictObject({
  n: PhotoNumberSchema,
  caption: z.string(),
  taken: z.nullable(z.string()),
  pins: z.array(PinSchema).check(z.refine((pins) => rises(pins.map(({ n }) => n)))),
});
export type PhotoWords = z.output<typeof PhotoWordsSchema>;

/** The photos a part speaks about, by n ascending. */
export const PhotoListSchema = z
  .array(PhotoWordsSchema)
  .check(z.refine((photos) => rises(photos.map(({ n }) => n))));

/** A wait for glue or finish; each time null where it has none. */
const RestSchema = z.strictObject({
  product: z.string(),
  from: InstantSchema,
  clampsOff: z.nullable(InstantSchema),
  worked: z.nullable(InstantSchema),
  strings: z.nullable(InstantSchema),
});

const members = {
  phase: z.enum(['before', 'during', 'after']),
  title: z.string(),
  text: z.string(),
  occurred: z.nullable(z.string()),
  used: z.array(z.string()),
  climate: z.nullable(z.strictObject({ temperature: MeasuredSchema, humidity: MeasuredSchema })),
  rest: z.nullable(RestSchema),
  by: PersonLabelSchema,
  photos: PhotoListSchema,
  copies: z.array(z.strictObject({ n: PhotoNumberSchema, of: PhotoNumberSchema })),
};

/** A whole entry, as a part that has other members of its own carries it. */
export const EntryBodySchema = z.strictObject(members);
export type EntryBody = z.output<typeof EntryBodySchema>;

/** Form 2 of what an entry, amendment, inspection or incident shows: the whole entry. */
export const EntryShownSchema = z.strictObject({ v: z.literal(2), ...members });
export type EntryShown = z.output<typeof EntryShownSchema>;
