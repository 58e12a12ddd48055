import { Hex16Schema, Hex32Schema, InstantSchema, wholeFrom } from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

/** What a warranty is now. */
const STANDING_WORDS = ['in force', 'ended', 'suspended', 'withdrawn', 'replaced'] as const;
const StandingWordSchema = z.enum(STANDING_WORDS);
export type StandingWord = z.output<typeof StandingWordSchema>;

export const STANDING_HEADER = { alg: 'Ed25519', typ: 'witnessmark-standing+jwt' } as const;

/**
 * The payload of a standing: the shop's word on a warranty under one checkpoint. It names the last
 * entry of the case and of the log's own chain, so that one kept back or denied later is provable.
 */
export const StandingSchema = z.strictObject({
  /** The warranty's leaf hash. */
  seal: Hex32Schema,
  standing: StandingWordSchema,
  at: InstantSchema,
  /** The case id, and seq and C of its last entry. */
  case: Hex16Schema,
  seq: wholeFrom(0),
  C: Hex32Schema,
  /** Seq and C of the last entry of the log's own chain. */
  ownSeq: wholeFrom(0),
  ownC: Hex32Schema,
  /** The whole note. */
  checkpoint: z.string(),
});
export type Standing = z.output<typeof StandingSchema>;
