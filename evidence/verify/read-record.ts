import { toHex } from '#evidence/bytes/hex.ts';
import type { Credential } from '#evidence/credential/credential-shape.ts';
import type { Header } from '#evidence/seal/header.ts';
import type { PartName } from '#evidence/seal/kinds.ts';
import type { Warranty } from '#evidence/verify/check-warranty.ts';
import { countingSigners } from '#evidence/verify/check-signers.ts';
import type { Item, Work } from '#evidence/verify/work.ts';

/** The salts a bundle discloses of one photo, hex, beside what its header commits to. */
export type RecordPhoto = Header['photos'][number] & {
  salts: { original: string | null; published: string | null };
};
/** An entry as it may be shown: nothing in it comes from bytes that were not checked. */
export type RecordEntry = {
  seq: number;
  /** The entry's place in the log, its leaf hash and its C as hex; C is null when not known. */
  index: number;
  leafHash: string;
  commitment: string | null;
  /** Null when its contents are lost or of a form not known here. */
  header: Header | null;
  /** The disclosed parts that were read, by name, each in the form its `v` names. */
  parts: Partial<Record<PartName, unknown>>;
  photos: RecordPhoto[];
};
/** The record a bundle holds, for showing it. */
export type RecordShown = {
  origin: string;
  /** The log key that signed the head, and the head itself. */
  logKeyId: string | null;
  size: number;
  root: string;
  caseId: string | null;
  entries: RecordEntry[];
  /** The warranty's seal value and credential, when there is one. */
  sealValue: string | null;
  credential: Credential | null;
};

/** Gathers what was checked, for showing. */
export function readRecord(work: Work, warranty: Warranty | null): RecordShown {
  const { head, chain } = work;
  return {
    origin: head.origin,
    logKeyId: countingSigners(work, head)[0]?.key.id ?? null,
    size: head.size,
    root: toHex(head.root),
    caseId: chain[0]?.case ?? null,
    entries: chain.map(entryOf),
    sealValue: warranty && toHex(warranty.leaf.leafHash),
    credential: warranty?.credential ?? null,
  };
}

function entryOf(item: Item): RecordEntry {
  const { seq, index, commitment, header, entry } = item;
  const photos = (header?.photos ?? []).map((photo, at) => {
    const { original = null, published = null } = entry?.photos[at] ?? {};
    return { ...photo, salts: { original, published } };
  });
  const parts = Object.fromEntries(item.parts);
  return { seq, index, leafHash: toHex(item.leafHash), commitment, header, parts, photos };
}
