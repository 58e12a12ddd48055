import { toHex } from '#evidence/bytes/hex.ts';
import type { PartValue } from '#evidence/chain/part-schema.ts';
import { writePart } from '#evidence/chain/write-part.ts';
import { ShapeError } from '#evidence/errors.ts';
import { headerBytes } from '#evidence/seal/header-bytes.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import type { After, Header, Visibility } from '#evidence/seal/header.ts';
import type { Kind, PartName } from '#evidence/seal/kinds.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { logEntry } from '#evidence/seal/log-entry.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import { photoCommitment } from '#evidence/seal/photo-commitment.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';

/** SHA-256 of a file and the salt its commitment takes, 32 bytes each. */
export type SaltedFile = { sha256: Uint8Array; salt: Uint8Array };
/** A photo about to be sealed. */
export type EntryPhoto = {
  n: number;
  visibility: Visibility;
  original: SaltedFile;
  published: SaltedFile;
};
/** A part about to be sealed. */
export type EntryPart<K extends Kind, N extends PartName> = {
  value: PartValue<K, N>;
  salt: Uint8Array;
};

/** All that one entry is made from; nothing is drawn or read from a clock. */
export type EntryToWrite<K extends Kind> = {
  kind: K;
  /** 16 bytes; zeros for the log's own chain. */
  caseId: Uint8Array;
  seq: number;
  /** C of the entry before it in its chain. */
  prev: Uint8Array | null;
  recordedAt: string;
  occurredAt: string | null;
  parts: { [N in PartName]?: EntryPart<K, N> };
  /** By n ascending. */
  photos: EntryPhoto[];
  /** C of the entries it names. */
  names: Uint8Array[];
  after: After | null;
  visibility: Visibility;
  /** The header's own salt. */
  salt: Uint8Array;
};

/** A sealed part: its exact bytes, its salt, and the commitment the header holds. */
export type WrittenPart = { bytes: Uint8Array; salt: Uint8Array; commitment: Uint8Array };
/** An entry ready to be appended. */
export type WrittenEntry = {
  header: Header;
  headerBytes: Uint8Array;
  parts: Partial<Record<PartName, WrittenPart>>;
  commitment: Uint8Array;
  tag: Uint8Array;
  entry: Uint8Array;
  leafHash: Uint8Array;
};

/**
 * Makes one entry: its parts' bytes and commitments, its header, and the 65 bytes that the log
 * holds of it.
 * @throws ShapeError, SealedJsonError, LimitError or EncodingError when something of it cannot be
 *   sealed; nothing was done then
 */
export function writeEntry<K extends Kind>(entry: EntryToWrite<K>): WrittenEntry {
  refuseSharedSalts(entry);
  const parts = writeParts(entry);
  const header: Header = {
    v: 1,
    kind: entry.kind,
    case: toHex(entry.caseId),
    seq: entry.seq,
    prev: entry.prev && toHex(entry.prev),
    recordedAt: entry.recordedAt,
    occurredAt: entry.occurredAt,
    parts: Object.fromEntries(
      Object.entries(parts).map(([name, part]) => [name, toHex(part.commitment)]),
    ),
    photos: entry.photos.map(({ n, visibility, original, published }) => ({
      n,
      original: toHex(photoCommitment('original', original.salt, original.sha256)),
      published: toHex(photoCommitment('published', published.salt, published.sha256)),
      visibility,
    })),
    names: entry.names.map(toHex),
    after: entry.after,
    visibility: entry.visibility,
  };
  const bytes = headerBytes(header);
  const commitment = headerCommitment(entry.salt, bytes);
  const tag = slotTag(entry.caseId, entry.seq);
  const logged = logEntry(tag, commitment);
  const leaf = leafHash(logged);
  return { header, headerBytes: bytes, parts, commitment, tag, entry: logged, leafHash: leaf };
}

/** A salt used twice would show that two commitments hide the same thing. */
function refuseSharedSalts<K extends Kind>({ salt, parts, photos }: EntryToWrite<K>): void {
  const salts = [
    salt,
    ...Object.values(parts).map((part: { salt: Uint8Array }) => part.salt),
    ...photos.flatMap(({ original, published }) => [original.salt, published.salt]),
  ].map(toHex);
  if (new Set(salts).size !== salts.length) throw new ShapeError('A salt is used only once.');
}

function writeParts<K extends Kind>(entry: EntryToWrite<K>): WrittenEntry['parts'] {
  const written: WrittenEntry['parts'] = {};
  for (const name of Object.keys(entry.parts) as PartName[]) {
    const part = entry.parts[name] as EntryPart<K, PartName> | undefined;
    if (!part) continue;
    const bytes = writePart(entry.kind, name, part.value);
    const commitment = partCommitment(name, part.salt, bytes);
    written[name] = { bytes, salt: part.salt, commitment };
  }
  return written;
}
