import { Conflict, TooLarge } from '#domain/errors.ts';
import { toInstant } from '#evidence/bytes/instant.ts';
import { LimitError } from '#evidence/errors.ts';
import { ENTRIES_PER_CASE, PHOTOS_PER_ENTRY } from '#evidence/limits.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';
import { LOG_CASE, type Visibility } from '#evidence/seal/header.ts';
import type { Kind, PartName } from '#evidence/seal/kinds.ts';
import { writeEntry, type EntryToWrite } from '#evidence/seal/write-entry.ts';
import { run, select, type Transaction } from '#server/db/sql.ts';
import { drawSalt } from './draw-salt.ts';
import { keepNodes, withNodes } from './log-nodes.ts';
import { lockHead } from './log-state.ts';
import { queueSignHead } from './queue-sign-head.ts';
import { recordedAt } from './recorded-at.ts';
import { storeSealed } from './store-sealed.ts';

/** A photo to be sealed: the SHA-256 of both its files, 32 bytes each. */
export interface NewPhoto {
  /** Its number in the case, from 1. */
  n: number;
  visibility: Visibility;
  originalSha256: Uint8Array;
  publishedSha256: Uint8Array;
}

/** What is to be sealed. `names` are commitments (C) of earlier entries of the same chain. */
export interface NewEntry {
  /** The case's record id, or sixteen zero bytes for the log's own chain; 16 bytes. */
  chain: Uint8Array;
  kind: Kind;
  visibility: Visibility;
  occurredAt: Date | null;
  parts: Partial<Record<PartName, object>>;
  photos: NewPhoto[];
  names: Uint8Array[];
  now: Date;
}

/** Where the entry went, and the salts that must be kept with its photos. */
export interface Appended {
  leafIndex: number;
  seq: number;
  recordedAt: Date;
  /** C, 32 bytes. */
  commitment: Buffer;
  /** 32 bytes; of a warranty the seal value. */
  leafHash: Buffer;
  photoSalts: Map<number, { original: Buffer; published: Buffer }>;
}

async function endOfChain(chain: Uint8Array, tx: Transaction) {
  const [last] = await select<{ seq: number; commitment: Buffer }>(
    'SELECT seq, commitment FROM sealed_entries WHERE chain = ? ORDER BY seq DESC LIMIT 1',
    [Buffer.from(chain)],
    tx,
  );
  return { seq: last ? last.seq + 1 : 0, prev: last?.commitment ?? null };
}

function refuseTooMany(entry: NewEntry, seq: number): void {
  if (entry.photos.length > PHOTOS_PER_ENTRY) {
    throw new TooLarge(
      `This entry has ${entry.photos.length} photos; ${PHOTOS_PER_ENTRY} can be sealed together. Move some to another entry.`,
    );
  }
  const isLog = Buffer.from(entry.chain).toString('hex') === LOG_CASE;
  if (!isLog && seq >= ENTRIES_PER_CASE) {
    throw new Conflict(
      `A case holds at most ${ENTRIES_PER_CASE} sealed entries and this one is full. Take the instrument in as a new case.`,
    );
  }
}

function seal(entry: NewEntry, at: Date, seq: number, prev: Buffer | null) {
  const parts = Object.entries(entry.parts).map(([name, value]) => [
    name,
    { value, salt: drawSalt() },
  ]);
  const photos = [...entry.photos]
    .sort((a, b) => a.n - b.n)
    .map(({ n, visibility, originalSha256, publishedSha256 }) => ({
      n,
      visibility,
      original: { sha256: originalSha256, salt: drawSalt() },
      published: { sha256: publishedSha256, salt: drawSalt() },
    }));
  const salt = drawSalt();
  try {
    const sealed = writeEntry({
      kind: entry.kind,
      caseId: entry.chain,
      seq,
      prev,
      recordedAt: toInstant(at),
      occurredAt: entry.occurredAt && toInstant(entry.occurredAt),
      visibility: entry.visibility,
      // The shapes are checked against the kind while they are written.
      parts: Object.fromEntries(parts) as EntryToWrite<Kind>['parts'],
      photos,
      names: entry.names,
      after: null,
      salt,
    });
    return { sealed, salt, photos };
  } catch (error) {
    if (!(error instanceof LimitError)) throw error;
    throw new TooLarge('This entry is too long to be sealed. Split it into two entries.');
  }
}

/**
 * Appends one entry to the witness log, under the head lock, in the transaction of its cause: the
 * entry is sealed when that transaction commits. Reads and writes about 2·log2 n rows.
 * @throws Conflict when the clock is behind or the chain is full, TooLarge beyond the limits of an
 *   entry, ShapeError (a defect of the caller) for parts that are not the shape of the kind
 */
export async function appendEntry(tx: Transaction, entry: NewEntry): Promise<Appended> {
  const head = await lockHead(tx);
  // An entry that says the clock was wrong is the one that may go back.
  const at = entry.kind === 'clock' ? entry.now : recordedAt(entry.now, head.lastRecordedAt);
  const { seq, prev } = await endOfChain(entry.chain, tx);
  refuseTooMany(entry, seq);
  const { sealed, salt, photos } = seal(entry, at, seq, prev);
  const leafIndex = head.size;
  await storeSealed(tx, { leafIndex, seq, at, entry, sealed, salt });
  await keepNodes(
    await withNodes((read) => nodesOfAppend(leafIndex, sealed.leafHash, read), tx),
    tx,
  );
  await run('UPDATE log_states SET size = ?, last_recorded_at = ?', [leafIndex + 1, at], tx);
  await queueSignHead(tx);
  return {
    leafIndex,
    seq,
    recordedAt: at,
    commitment: Buffer.from(sealed.commitment),
    leafHash: Buffer.from(sealed.leafHash),
    photoSalts: new Map(
      photos.map(({ n, original, published }) => [
        n,
        { original: original.salt, published: published.salt },
      ]),
    ),
  };
}
