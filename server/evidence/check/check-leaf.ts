import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { toInstant } from '#evidence/bytes/instant.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { EvidenceError } from '#evidence/errors.ts';
import type { Header } from '#evidence/seal/header.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import type { Kind, PartName } from '#evidence/seal/kinds.ts';
import { logEntry } from '#evidence/seal/log-entry.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import { photoCommitment, type PhotoCopy } from '#evidence/seal/photo-commitment.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';
import { sameBytes, type Differences } from './differences.ts';
import type { LeafRow, PhotoRow } from './leaf-rows.ts';

/** A leaf that was read: its header, and parts that are gone and must be named as erased. */
export interface CheckedLeaf {
  header: Header;
  /** C, hex. */
  commitment: string;
  goneParts: string[];
  /** What `shown` holds, when it is there and as it was sealed. */
  shown: unknown;
}

type Attempt = <T>(what: string, work: () => T) => T | undefined;

function checkColumns(row: LeafRow, header: Header, found: Differences): void {
  const which = `leaf ${row.leafIndex}`;
  const columns: [string, boolean][] = [
    ['chain', row.chain !== null && toHex(row.chain) === header.case],
    ['seq', row.seq === header.seq],
    ['kind', row.kind === header.kind],
    ['recorded_at', row.recordedAt !== null && toInstant(row.recordedAt) === header.recordedAt],
  ];
  for (const [column, same] of columns) {
    found.expect(same, `sealed_entries.${column}`, which, 'is not what the header says');
  }
}

function checkEntry(row: LeafRow, header: Header, found: Differences): string {
  const which = `leaf ${row.leafIndex}`;
  const C = headerCommitment(row.headerSalt ?? Buffer.alloc(32), row.header ?? Buffer.alloc(0));
  found.expect(
    sameBytes(C, row.commitment),
    'sealed_entries.header, header_salt or commitment',
    which,
    'do not belong together',
  );
  const entry = logEntry(slotTag(fromHex(header.case), header.seq), C);
  found.expect(
    sameBytes(entry, row.entry),
    'log_leaves.entry or sealed_entries.header',
    which,
    'the log entry is not the one its header makes',
  );
  return toHex(C);
}

function checkParts(row: LeafRow, header: Header, found: Differences, attempt: Attempt) {
  const gone: string[] = [];
  let shown: unknown;
  const names = new Set(row.parts.map(({ name }) => name));
  for (const name of Object.keys(header.parts)) {
    const which = `leaf ${row.leafIndex}, ${name}`;
    found.expect(names.has(name), 'sealed_parts.name', which, 'the part is missing');
  }
  for (const { name, bytes, salt } of row.parts) {
    const which = `leaf ${row.leafIndex}, ${name}`;
    found.seen('parts');
    const commitment = Object.hasOwn(header.parts, name) ? header.parts[name] : undefined;
    if (!found.expect(commitment !== undefined, 'sealed_parts.name', which, 'was never sealed')) {
      continue;
    }
    if (bytes === null || salt === null) {
      gone.push(name);
      continue;
    }
    const same = toHex(partCommitment(name, salt, bytes)) === commitment;
    if (!found.expect(same, 'sealed_parts.bytes or salt', which, 'is not what was sealed'))
      continue;
    const value = attempt(`sealed_parts.bytes of ${which}`, () =>
      readPart(header.kind as Kind, name as PartName, bytes),
    );
    if (name === 'shown') shown = value;
  }
  return { gone, shown };
}

function checkPhoto(
  header: Header['photos'][number],
  row: PhotoRow | undefined,
  which: string,
  found: Differences,
): void {
  if (!row) return found.add('entry_photos or photos.number', which, 'the photo is missing');
  found.seen('photos');
  const copies: [PhotoCopy, Buffer | null, Buffer | null, string][] = [
    ['original', row.originalSalt, row.original, header.original],
    ['published', row.publishedSalt, row.published, header.published],
  ];
  for (const [copy, salt, hash, commitment] of copies) {
    const table = copy === 'original' ? 'photos.sha256' : 'photo_copies.sha256';
    const same = salt && hash && toHex(photoCommitment(copy, salt, hash)) === commitment;
    found.expect(
      Boolean(same),
      `${table} or entry_photos.${copy}_salt`,
      which,
      'is not what was sealed',
    );
  }
}

function checkPhotos(row: LeafRow, header: Header, found: Differences): void {
  for (const photo of header.photos) {
    const kept = row.photos.find(({ n }) => n === photo.n);
    checkPhoto(photo, kept, `leaf ${row.leafIndex}, photo ${photo.n}`, found);
  }
  const sealed = new Set(header.photos.map(({ n }) => n));
  for (const { n } of row.photos) {
    const which = `leaf ${row.leafIndex}, photo ${n}`;
    found.expect(
      sealed.has(n),
      'entry_photos or photos.number',
      which,
      'was never sealed with this entry',
    );
  }
}

/** Recomputes one leaf from its header, salts, parts and photos. Null when it cannot be read at all. */
export function checkLeaf(row: LeafRow, found: Differences): CheckedLeaf | null {
  const which = `leaf ${row.leafIndex}`;
  const attempt: Attempt = (what, work) => {
    try {
      return work();
    } catch (error) {
      if (!(error instanceof EvidenceError)) throw error;
      found.add(what, which, `cannot be read: ${error.message}`);
      return undefined;
    }
  };
  const { header: bytes } = row;
  if (!bytes) {
    found.add('sealed_entries', which, 'the entry of this leaf is missing');
    return null;
  }
  const header = attempt('sealed_entries.header', () => readHeader(bytes));
  if (!header) return null;
  checkColumns(row, header, found);
  const commitment = checkEntry(row, header, found);
  const { gone, shown } = checkParts(row, header, found, attempt);
  checkPhotos(row, header, found);
  return { header, commitment, goneParts: gone, shown };
}
