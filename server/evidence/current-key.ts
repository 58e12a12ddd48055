import { select, type Transaction } from '#server/db/sql.ts';
import type { KeyUse } from './key-files.ts';

/** A public key as a `key` leaf of the log names it. */
export interface PublicKey {
  /** 32 hex digits. */
  id: string;
  use: KeyUse | 'witness';
  alg: 'Ed25519' | 'RSA-3072';
  /** DER SubjectPublicKeyInfo. */
  spki: Buffer;
  vkey: string | null;
  /** DER of one certificate; of paper keys only. */
  certificate: Buffer | null;
  addedAtLeaf: number;
  retiredAtLeaf: number | null;
  revokedAtLeaf: number | null;
}

interface Row {
  id: string;
  use: PublicKey['use'];
  alg: PublicKey['alg'];
  spki: Buffer;
  vkey: string | null;
  certificate: Buffer | null;
  added_at_leaf: string;
  retired_at_leaf: string | null;
  revoked_at_leaf: string | null;
}

const leaf = (text: string | null) => (text === null ? null : Number(text));

/** Every key the log has named, in the order it named them. */
export async function publicKeys(tx?: Transaction): Promise<PublicKey[]> {
  const rows = await select<Row>(
    `SELECT id, \`use\`, alg, spki, vkey, certificate, added_at_leaf, retired_at_leaf, revoked_at_leaf
     FROM signing_keys ORDER BY added_at_leaf`,
    [],
    tx,
  );
  return rows.map(({ added_at_leaf, retired_at_leaf, revoked_at_leaf, ...row }) => ({
    ...row,
    addedAtLeaf: Number(added_at_leaf),
    retiredAtLeaf: leaf(retired_at_leaf),
    revokedAtLeaf: leaf(revoked_at_leaf),
  }));
}

/**
 * The key that signs now: the last one added for this use that is neither retired nor revoked.
 * @throws Error when the log names none
 */
export async function currentKey(use: KeyUse, tx?: Transaction): Promise<PublicKey> {
  const current = (await publicKeys(tx)).findLast(
    (key) => key.use === use && key.retiredAtLeaf === null && key.revokedAtLeaf === null,
  );
  if (!current) throw new Error(`The witness log names no ${use} key that may sign.`);
  return current;
}
