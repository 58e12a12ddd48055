import { z } from '#evidence/shape/zod.ts';

export const BUNDLE_FORMAT = 'witnessmark-bundle/1';

/** A disclosed part: its sealed text and its salt as hex. */
export const BundlePartSchema = z.object({ bytes: z.string(), salt: z.string() });
/** The salts of a photo as hex; null for one kept back. */
export const BundlePhotoSchema = z.object({
  n: z.int(),
  original: z.nullable(z.string()),
  published: z.nullable(z.string()),
});
/** An entry: its sealed header, what is disclosed of it, and its proof. A part kept back is absent. */
export const BundleEntrySchema = z.object({
  header: z.string(),
  salt: z.string(),
  parts: z.record(z.string(), BundlePartSchema),
  photos: z.array(BundlePhotoSchema),
  proof: z.string(),
});
/** An entry whose contents are lost: its 65 bytes as hex, and its proof. */
export const LostEntrySchema = z.object({ entry: z.string(), proof: z.string() });
/** A time-stamp: the checkpoint it is over, and the authority's reply as base64. */
export const BundleStampSchema = z.object({ checkpoint: z.string(), reply: z.string() });

/** The whole bundle but for its entries, which are read one by one. */
export const BundleFrameSchema = z.object({
  format: z.literal(BUNDLE_FORMAT),
  origin: z.string(),
  vkeys: z.array(z.string()),
  entries: z.array(z.unknown()),
  credential: z.nullable(z.string()),
  stamps: z.array(BundleStampSchema),
  consistency: z.array(z.string()),
  standing: z.nullable(z.string()),
});

export type BundleEntry = z.output<typeof BundleEntrySchema>;
export type LostEntry = z.output<typeof LostEntrySchema>;
export type BundleStamp = z.output<typeof BundleStampSchema>;
/** A record as a file: the log's own chain, then one case, each by seq. */
export type Bundle = Omit<z.output<typeof BundleFrameSchema>, 'entries'> & {
  entries: (BundleEntry | LostEntry)[];
};

/** Whether an item of a bundle is an entry whose contents are lost. */
export function isLostEntry(item: BundleEntry | LostEntry): item is LostEntry {
  return 'entry' in item;
}
