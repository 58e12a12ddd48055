import { toHex } from '#evidence/bytes/hex.ts';
import { toInstant } from '#evidence/bytes/instant.ts';
import type { StandingShown } from '#evidence/chain/case-shown.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import type { StandingWord } from '#evidence/standing/standing-shape.ts';
import { signStanding } from '#evidence/standing/sign-standing.ts';
import { standingWord } from '#evidence/standing/standing-word.ts';
import { select } from '#server/db/sql.ts';
import { OWN_CHAIN } from '#server/evidence/own-chain.ts';
import type { PublishedHead } from '#server/evidence/newest-checkpoint.ts';
import { signingKey } from '#server/evidence/signing-key.ts';
import type { SealedWarranty } from './sealed-warranty.ts';

interface End {
  seq: number;
  commitment: Buffer;
}

async function endUnder(chain: Buffer, size: number): Promise<End> {
  const [end] = await select<End>(
    `SELECT seq, commitment FROM sealed_entries
     WHERE chain = ? AND leaf_index < ? ORDER BY seq DESC LIMIT 1`,
    [chain, size],
  );
  if (!end) throw new Error('Nothing of this chain is under the head.');
  return end;
}

/** What was done about a warranty, as sealed under a head of `size` entries, in order. */
async function actsUnder(
  { record, commitment }: SealedWarranty,
  size: number,
): Promise<StandingShown['act'][]> {
  const rows = await select<{ header: Buffer; bytes: Buffer }>(
    `SELECT s.header, p.bytes FROM sealed_entries s
     JOIN sealed_parts p ON p.leaf_index = s.leaf_index AND p.name = 'shown'
     WHERE s.chain = ? AND s.kind = 'standing' AND s.leaf_index < ? ORDER BY s.seq`,
    [record, size],
  );
  const own = toHex(commitment);
  // A replacement names the old warranty first: the new one is not touched by it.
  return rows
    .filter(({ header }) => readHeader(header).names[0] === own)
    .map(({ bytes }) => readPart('standing', 'shown', bytes).act);
}

/** What a warranty is at `at`, as the log says it under the head. */
export async function standingUnder(
  warranty: SealedWarranty,
  head: PublishedHead,
  at: Date,
): Promise<StandingWord> {
  const acts = await actsUnder(warranty, head.size);
  return standingWord(acts, toInstant(warranty.validUntil), toInstant(at));
}

/**
 * The shop's signed word on a warranty under one checkpoint. It names the last entries of the case
 * and of the log's own chain, so that one kept back or denied later is provable.
 */
export async function signedStanding(
  warranty: SealedWarranty,
  head: PublishedHead,
  at: Date,
): Promise<string> {
  const [last, own] = await Promise.all([
    endUnder(warranty.record, head.size),
    endUnder(OWN_CHAIN, head.size),
  ]);
  const standing = {
    seal: toHex(warranty.seal),
    standing: await standingUnder(warranty, head, at),
    at: toInstant(at),
    case: toHex(warranty.record),
    seq: last.seq,
    C: toHex(last.commitment),
    ownSeq: own.seq,
    ownC: toHex(own.commitment),
    checkpoint: head.note,
  };
  return signStanding(standing, await signingKey('credential'));
}
