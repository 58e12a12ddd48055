import {
  isLostEntry,
  type Bundle,
  type BundleEntry,
  type LostEntry,
} from '#evidence/bundle/bundle-shape.ts';
import { equal } from '#evidence/bytes/equal.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { ProofError } from '#evidence/errors.ts';
import { verifyInclusion } from '#evidence/merkle/verify-inclusion.ts';
import type { Checkpoint } from '#evidence/note/read-checkpoint.ts';
import { readTlogProof } from '#evidence/proof/tlog-proof.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import { LOG_CASE, type Header } from '#evidence/seal/header.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { isKnownEntry, logEntry, readLogEntry } from '#evidence/seal/log-entry.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';
import type { Findings } from '#evidence/verify/finding.ts';
import { attempt, placeOf, type Item } from '#evidence/verify/work.ts';

type Slot = { case: string; seq: number };

/**
 * Gives every item of a bundle its slot, its commitment and its place in the log, and checks each
 * inclusion proof. An item whose header is lost or of an unknown form gets the slot its neighbours
 * leave open: the slot tag, or the proof over it, tells whether that is right.
 * @returns the items whose proof holds, in the bundle's order
 */
export function placeItems(
  bundle: Bundle,
  checkpoints: Map<string, Checkpoint>,
  findings: Findings,
): Item[] {
  const headers = bundle.entries.map((item, at) => {
    if (isLostEntry(item)) return null;
    const data = { position: at };
    return attempt(findings, 'header', data, () => readHeader(toUtf8(item.header))) ?? null;
  });
  const items: Item[] = [];
  bundle.entries.forEach((item, at) => {
    const placed = attempt(findings, 'inclusion', { position: at }, () =>
      place(item, headers[at]!, slotsFor(headers, at), checkpoints),
    );
    if (placed) items.push(placed);
  });
  if (items.length > 0 && items.length === bundle.entries.length) {
    findings.checked('inclusion', { count: items.length });
  }
  return items;
}

/** The slots an item can have: its header's, or what its neighbours leave open. */
function slotsFor(headers: (Header | null)[], at: number): Slot[] {
  const own = headers[at];
  if (own) return [{ case: own.case, seq: own.seq }];
  const before = headers.findLastIndex((header, other) => other < at && header !== null);
  const after = headers.findIndex((header, other) => other > at && header !== null);
  const slots: Slot[] = [before, after].flatMap((other) => {
    const header = headers[other];
    return header ? [{ case: header.case, seq: header.seq + (at - other) }] : [];
  });
  return slots.filter(({ seq }) => seq >= 0);
}

function place(
  item: BundleEntry | LostEntry,
  header: Header | null,
  slots: Slot[],
  checkpoints: Map<string, Checkpoint>,
): Item {
  const { index, hashes, checkpoint: under } = readTlogProof(item.proof);
  const checkpoint = checkpoints.get(under);
  if (!checkpoint) throw new ProofError('Its proof is under a checkpoint that does not hold.');
  const { size, root } = checkpoint;
  const rest = { index, under, header, entry: isLostEntry(item) ? null : item, parts: new Map() };
  for (const slot of slots) {
    const { leaf, commitment } = loggedAs(item, slot);
    if (leaf && verifyInclusion({ index, size, root, leafHash: leaf, proof: hashes })) {
      return { ...slot, ...rest, commitment, leafHash: leaf };
    }
  }
  const [slot] = slots;
  if (header || isLostEntry(item) || !slot) throw new ProofError('Its proof does not hold.');
  // A header of an unknown form was reported; how such a one is committed to is not known either.
  return { ...slot, ...rest, commitment: null, leafHash: new Uint8Array(32) };
}

type Logged = { leaf: Uint8Array | null; commitment: string | null };

/** Leaf hash and C of an item in a slot; no leaf when a lost entry is not of that slot. */
function loggedAs(item: BundleEntry | LostEntry, slot: Slot): Logged {
  const tag = slotTag(fromHex(slot.case), slot.seq);
  if (!isLostEntry(item)) {
    const commitment = headerCommitment(fromHex(item.salt, 32), toUtf8(item.header));
    return { leaf: leafHash(logEntry(tag, commitment)), commitment: toHex(commitment) };
  }
  const entry = fromHex(item.entry);
  // An entry of an unknown form is still a leaf; its slot and C are not known.
  if (!isKnownEntry(entry)) return { leaf: leafHash(entry), commitment: null };
  const logged = readLogEntry(entry);
  const inSlot = equal(logged.tag, tag);
  return { leaf: inSlot ? leafHash(entry) : null, commitment: toHex(logged.commitment) };
}

/** Splits placed items into the log's own chain and the case, and checks the bundle's order. */
export function splitChains(items: Item[], findings: Findings): { own: Item[]; chain: Item[] } {
  const own = items.filter((item) => item.case === LOG_CASE);
  const chain = items.filter((item) => item.case !== LOG_CASE);
  const ordered = [...own, ...chain];
  const misplaced = items.find((item, at) => item !== ordered[at]);
  if (misplaced) findings.failed('own-chain', { ...placeOf(misplaced), because: 'out of order' });
  if (new Set(chain.map((item) => item.case)).size > 1) {
    findings.failed('case-chain', { because: 'entries of two cases' });
  }
  return { own, chain };
}
