import {
  Base64Schema,
  Hex16Schema,
  Hex32Schema,
  InstantSchema,
  wholeFrom,
} from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

const v = z.literal(1);

/** The first leaf: the log's name and first key, and the head of the log it replaces, if any. */
export const LogStartShownSchema = z.strictObject({
  v,
  origin: z.string(),
  vkey: z.string(),
  replaces: z.nullable(
    z.strictObject({
      origin: z.string(),
      size: wholeFrom(0),
      root: Hex32Schema,
      reason: z.string(),
    }),
  ),
});
export type LogStartShown = z.output<typeof LogStartShownSchema>;

/** What a key is for; no key has two uses. */
const KeyUseSchema = z.enum(['log', 'credential', 'paper', 'witness']);
export type KeyUse = z.output<typeof KeyUseSchema>;

/** A key is added, retired or revoked; the last two repeat what the first said of it. */
export const KeyShownSchema = z.strictObject({
  v,
  use: KeyUseSchema,
  act: z.enum(['add', 'retire', 'revoke']),
  id: Hex16Schema,
  alg: z.enum(['Ed25519', 'RSA-3072']),
  spki: Base64Schema,
  vkey: z.nullable(z.string()),
  cert: z.nullable(Base64Schema),
  reason: z.nullable(z.string()),
});
export type KeyShown = z.output<typeof KeyShownSchema>;

/** SHA-256 of time-stamp replies that no entry's `after` names, so that they are covered too. */
export const StampsShownSchema = z.strictObject({ v, replies: z.array(Hex32Schema) });
export type StampsShown = z.output<typeof StampsShownSchema>;

/** The shop's clock was set: what it had said last, what it says now. */
export const ClockShownSchema = z.strictObject({
  v,
  old: InstantSchema,
  new: InstantSchema,
  reason: z.string(),
});
export type ClockShown = z.output<typeof ClockShownSchema>;

/** Leaves whose contents are gone, from index to index, both included. */
export const LostShownSchema = z
  .strictObject({ v, from: wholeFrom(0), to: wholeFrom(0), reason: z.string() })
  .check(z.refine(({ from, to }) => from <= to));
export type LostShown = z.output<typeof LostShownSchema>;
