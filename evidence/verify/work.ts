import type { Bundle, BundleEntry } from '#evidence/bundle/bundle-shape.ts';
import { EvidenceError } from '#evidence/errors.ts';
import type { Checkpoint } from '#evidence/note/read-checkpoint.ts';
import type { Header } from '#evidence/seal/header.ts';
import type { PartName } from '#evidence/seal/kinds.ts';
import type { FindingData, FindingId, Findings } from '#evidence/verify/finding.ts';
import type { KeyTable } from '#evidence/verify/key-table.ts';

/** What somebody checking a record brings from outside of it. */
export type Outside = {
  /** A log key id, 32 hex, that was not taken from the paper or bundle being checked. */
  logKeyId?: string;
  /** Where that id came from. */
  logKeyFrom?: 'address' | 'earlier-paper' | 'remembered' | 'other-qr';
  /** The address it is published at, when it came from there. */
  address?: string;
  /** The first 16 bytes of the seal value, from the paper's QR. */
  seal16?: Uint8Array;
  /** The code of the paper, eleven signs. */
  code?: string;
  /** The log's public entries from index 0: entry bundles joined. */
  publicEntries?: Uint8Array;
};

/** One item of a bundle while it is checked. */
export type Item = {
  /** Its slot: the case id as hex, and its place in that chain. */
  case: string;
  seq: number;
  /** C as hex; null where the form of entry or header is not known here. */
  commitment: string | null;
  /** Its leaf hash, and its index in the log. */
  leafHash: Uint8Array;
  index: number;
  /** The note its inclusion was proven under. */
  under: string;
  /** Null when its contents are lost or of a form not known here. */
  header: Header | null;
  /** What the bundle discloses of it; null when its contents are lost. */
  entry: BundleEntry | null;
  /** The parts that were read, by name; only those whose commitment held. */
  parts: Map<PartName, unknown>;
};

/** Everything the checks share. */
export type Work = {
  bundle: Bundle;
  outside: Outside;
  findings: Findings;
  /** Every checkpoint of the bundle whose signatures hold, by its text. */
  checkpoints: Map<string, Checkpoint>;
  head: Checkpoint;
  /** The log's own chain and the case, each by seq. */
  own: Item[];
  chain: Item[];
  keys: KeyTable;
};

/** All items, the log's own chain first. */
export function itemsOf(work: Pick<Work, 'own' | 'chain'>): Item[] {
  return [...work.own, ...work.chain];
}

/** Which entry a finding speaks of. */
export function placeOf(item: Pick<Item, 'case' | 'seq'>): FindingData {
  return { chain: /^0+$/.test(item.case) ? 'log' : 'case', seq: item.seq };
}

/** A shown part that was read, or undefined. The reader has held it against its kind's form. */
export function shownOf<Shown>(item: Item, kind: string): Shown | undefined {
  return item.header?.kind === kind ? (item.parts.get('shown') as Shown | undefined) : undefined;
}

/**
 * Runs one check and files what it throws: a form not known here as not checked, everything else
 * the evidence refuses as failed.
 * @returns what the check gave, or undefined
 */
export function attempt<T>(
  findings: Findings,
  id: FindingId,
  data: FindingData,
  check: () => T,
): T | undefined {
  try {
    return check();
  } catch (error) {
    if (!(error instanceof EvidenceError)) throw error;
    const because = { ...data, because: error.message };
    if (error.code === 'unknown-form') findings.notChecked(id, because);
    else findings.failed(id, because);
    return undefined;
  }
}
