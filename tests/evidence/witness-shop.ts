import type { Bundle, BundleEntry, LostEntry } from '#evidence/bundle/bundle-shape.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { ed25519Spki } from '#evidence/key/ed25519-spki.ts';
import { keyId } from '#evidence/key/key-id.ts';
import { keyLeaf } from '#evidence/key/key-leaf.ts';
import type { KeyUse } from '#evidence/chain/log-shown.ts';
import { originOf } from '#evidence/log/origin.ts';
import { nodesOfAppend } from '#evidence/merkle/nodes-of-append.ts';
import type { NodeReader } from '#evidence/merkle/node-reader.ts';
import { proveConsistency } from '#evidence/merkle/prove-consistency.ts';
import { proveInclusion } from '#evidence/merkle/prove-inclusion.ts';
import { treeRoot } from '#evidence/merkle/tree-root.ts';
import { signCheckpoint } from '#evidence/note/sign-checkpoint.ts';
import { encodeVkey, LOG_TYPE } from '#evidence/note/vkey.ts';
import { writeConsistency } from '#evidence/proof/consistency-text.ts';
import { writeTlogProof } from '#evidence/proof/tlog-proof.ts';
import type { After, Visibility } from '#evidence/seal/header.ts';
import type { Kind, PartName } from '#evidence/seal/kinds.ts';
import { headerCommitment } from '#evidence/seal/header-commitment.ts';
import { leafHash } from '#evidence/seal/leaf-hash.ts';
import { logEntry } from '#evidence/seal/log-entry.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import { slotTag } from '#evidence/seal/slot-tag.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { writeEntry, type EntryToWrite, type WrittenEntry } from '#evidence/seal/write-entry.ts';
import { writeEntryBundle } from '#evidence/tiles/entry-bundle.ts';

const LOG = new Uint8Array(16);
export const UUID = '3f2a9c64-7d1b-4e08-9a55-0c6be1d2f713';

/** An entry of the simulated log, with all that a bundle can disclose of it. */
export type Sealed = WrittenEntry & {
  index: number;
  salt: Uint8Array;
  photoSalts: { n: number; original: string; published: string }[];
};
type Photo = { n: number; visibility?: Visibility };
type Wish = {
  parts?: { [N in PartName]?: object };
  photos?: Photo[];
  names?: Sealed[];
  visibility?: Visibility;
  occurredAt?: string | null;
  after?: After | null;
  minutes?: number;
};

/** The 32-byte secret a name stands for; nothing here is random, so every test can be run again. */
export const secretOf = (name: string) => sha256(toUtf8(`secret of ${name}`));
/** The key id of a secret. */
export const idOf = (secret: Uint8Array) => keyId(ed25519Spki(ed25519PublicKey(secret)));

/**
 * A shop with a log in memory that seals what it is told, honest or not: what the evidence checks
 * when writing holds, what only a verifier can see does not need to.
 */
export class WitnessShop {
  readonly origin = originOf(UUID);
  readonly log: Sealed[] = [];
  readonly vkeys: string[] = [];
  secret = secretOf('log');
  readonly credentialSecret = secretOf('credential');
  time = Date.parse('2026-04-09T09:12:44.318Z');
  private salts = 0;
  private readonly nodes = new Map<string, Uint8Array>();
  private readonly read: NodeReader = (level, index) => this.nodes.get(`${level}/${index}`)!;

  constructor(private readonly name = 'Wrenfield') {
    const vkey = this.vkeyOf(this.secret);
    this.append('log-start', LOG, {
      parts: { shown: { v: 1, origin: this.origin, vkey, replaces: null } },
    });
    this.addKey('log', this.secret);
    this.addKey('credential', this.credentialSecret);
  }

  salt(): Uint8Array {
    this.salts += 1;
    return sha256(toUtf8(`${this.name} salt ${this.salts}`));
  }

  vkeyOf(secret: Uint8Array): string {
    const publicKey = ed25519PublicKey(secret);
    return encodeVkey({ name: this.origin, type: LOG_TYPE, publicKey });
  }

  addKey(use: KeyUse, secret: Uint8Array): Sealed {
    if (use === 'log') this.vkeys.push(this.vkeyOf(secret));
    return this.endKey('add', use, secret, []);
  }

  endKey(act: 'add' | 'retire' | 'revoke', use: KeyUse, secret: Uint8Array, names: Sealed[]) {
    const spki = ed25519Spki(ed25519PublicKey(secret));
    const shown = keyLeaf({ use, act, spki, origin: this.origin, reason: null });
    return this.append('key', LOG, { parts: { shown }, names });
  }

  chainOf(caseId: Uint8Array): Sealed[] {
    return this.log.filter(({ header }) => header.case === toHex(caseId));
  }

  append(kind: Kind, caseId: Uint8Array, wish: Wish = {}): Sealed {
    const chain = this.chainOf(caseId);
    const photos = (wish.photos ?? []).map(({ n, visibility = 'shared' }) => {
      const file = (copy: string) => ({ sha256: fileHash(n, copy), salt: this.salt() });
      return { n, visibility, original: file('original'), published: file('published') };
    });
    this.time += (wish.minutes ?? 7) * 60_000;
    const parts = Object.entries(wish.parts ?? {}).map(([name, value]) => {
      return [name, { value, salt: this.salt() }];
    });
    const toWrite = {
      kind,
      caseId,
      seq: chain.length,
      prev: chain.at(-1)?.commitment ?? null,
      recordedAt: new Date(this.time).toISOString(),
      occurredAt: wish.occurredAt ?? null,
      parts: Object.fromEntries(parts) as EntryToWrite<Kind>['parts'],
      photos,
      names: (wish.names ?? []).map(({ commitment }) => commitment),
      after: wish.after ?? null,
      visibility: wish.visibility ?? 'shared',
      salt: this.salt(),
    } satisfies EntryToWrite<Kind>;
    const photoSalts = photos.map(({ n, original, published }) => {
      return { n, original: toHex(original.salt), published: toHex(published.salt) };
    });
    const written = writeEntry(toWrite);
    return this.push({ ...written, index: this.log.length, salt: toWrite.salt, photoSalts });
  }

  /**
   * Appends what a newer program might have: a header with members changed, parts as given, and
   * perhaps another first byte of the entry.
   */
  appendNewer(kind: string, change: object, parts: Record<string, object> = {}, firstByte = 2) {
    const chain = this.chainOf(CASE);
    this.time += 60_000;
    const written = Object.entries(parts).map(([name, value]) => {
      const [bytes, salt] = [sealJson(value), this.salt()];
      return [name, { bytes, salt, commitment: partCommitment(name, salt, bytes) }] as const;
    });
    const header = {
      ...chain[0]!.header,
      kind,
      seq: chain.length,
      prev: toHex(chain.at(-1)!.commitment),
      recordedAt: new Date(this.time).toISOString(),
      parts: Object.fromEntries(written.map(([name, part]) => [name, toHex(part.commitment)])),
      photos: [],
      names: [],
      ...change,
    } as Sealed['header'];
    const [salt, bytes] = [this.salt(), sealJson(header)];
    const commitment = headerCommitment(salt, bytes);
    const tag = slotTag(CASE, chain.length);
    const entry = logEntry(tag, commitment).with(0, firstByte);
    return this.push({
      header: { ...header, case: toHex(CASE), seq: chain.length },
      headerBytes: bytes,
      parts: Object.fromEntries(written),
      commitment,
      tag,
      entry,
      leafHash: leafHash(entry),
      index: this.log.length,
      salt,
      photoSalts: [],
    });
  }

  private push(sealed: Sealed): Sealed {
    for (const node of nodesOfAppend(sealed.index, sealed.leafHash, this.read)) {
      this.nodes.set(`${node.level}/${node.index}`, node.hash);
    }
    this.log.push(sealed);
    return sealed;
  }

  root(size = this.log.length): Uint8Array {
    return treeRoot(size, this.read);
  }

  checkpoint(size = this.log.length, secret = this.secret): string {
    return signCheckpoint({ origin: this.origin, size, root: this.root(size) }, secret);
  }

  item(sealed: Sealed, checkpoint: string, size: number): BundleEntry {
    const parts = Object.entries(sealed.parts).map(([name, { bytes, salt }]) => {
      return [name, { bytes: fromUtf8(bytes), salt: toHex(salt) }] as const;
    });
    return {
      header: fromUtf8(sealed.headerBytes),
      salt: toHex(sealed.salt),
      parts: Object.fromEntries(parts.filter(([name]) => name === 'shown' || name === 'smell')),
      photos: sealed.photoSalts,
      proof: this.proof(sealed, checkpoint, size),
    };
  }

  proof({ index }: Sealed, checkpoint: string, size: number): string {
    const hashes = proveInclusion(index, size, this.read);
    return writeTlogProof({ index, hashes, checkpoint });
  }

  lost(sealed: Sealed): LostEntry {
    const proof = this.proof(sealed, this.checkpoint(), this.log.length);
    return { entry: toHex(sealed.entry), proof };
  }

  growth(old: number): string {
    const hashes = proveConsistency(old, this.log.length, this.read);
    return writeConsistency({ old, hashes, checkpoint: this.checkpoint() });
  }

  /** The record of a case under the newest head, from a seq on. */
  bundle(caseId: Uint8Array, from = 0): Bundle {
    const [checkpoint, size] = [this.checkpoint(), this.log.length];
    const sealed = [...this.chainOf(LOG), ...this.chainOf(caseId).slice(from)];
    return {
      format: 'witnessmark-bundle/1',
      origin: this.origin,
      vkeys: [...this.vkeys],
      entries: sealed.map((one) => this.item(one, checkpoint, size)),
      credential: null,
      stamps: [],
      consistency: [],
      standing: null,
    };
  }

  publicEntries(): Uint8Array {
    return writeEntryBundle(this.log.map(({ entry }) => entry));
  }
}

/** SHA-256 of the invented file of a photo. */
export function fileHash(n: number, copy: string): Uint8Array {
  return sha256(fileOf(n, copy));
}

/** The invented file itself. */
export function fileOf(n: number, copy: string): Uint8Array {
  return toUtf8(`${copy} of photo ${n}`);
}

export const CASE = fromHex('00112233445566778899aabbccddeeff');
