import { toBase64 } from '#evidence/bytes/base64.ts';
import type { KeyShown } from '#evidence/chain/log-shown.ts';
import { publicKeys } from '../current-key.ts';
import type { Differences } from './differences.ts';

/** A key leaf as it was sealed. */
export interface KeyLeaf {
  leafIndex: number;
  shown: KeyShown;
}

/** Holds the table of keys against the log's key leaves. */
export async function checkKeys(leaves: KeyLeaf[], found: Differences): Promise<void> {
  const keys = await publicKeys();
  const of = (id: string, act: KeyShown['act']) =>
    leaves.find(({ shown }) => shown.id === id && shown.act === act);
  for (const { shown } of leaves.filter((leaf) => leaf.shown.act === 'add')) {
    const known = keys.some(({ id }) => id === shown.id);
    found.expect(known, 'signing_keys.id', `key ${shown.id}`, 'is missing');
  }
  for (const key of keys) {
    found.seen('keys');
    const which = `key ${key.id}`;
    const added = of(key.id, 'add');
    if (!added) {
      found.add('signing_keys.id', which, 'was never added in the log');
      continue;
    }
    const { shown, leafIndex } = added;
    const certificate = key.certificate && toBase64(key.certificate);
    const columns: [string, boolean][] = [
      ['use', key.use === shown.use],
      ['alg', key.alg === shown.alg],
      ['spki', toBase64(key.spki) === shown.spki],
      ['vkey', key.vkey === shown.vkey],
      ['certificate', certificate === shown.cert],
      ['added_at_leaf', key.addedAtLeaf === leafIndex],
      ['retired_at_leaf', key.retiredAtLeaf === (of(key.id, 'retire')?.leafIndex ?? null)],
      ['revoked_at_leaf', key.revokedAtLeaf === (of(key.id, 'revoke')?.leafIndex ?? null)],
    ];
    for (const [column, same] of columns) {
      found.expect(same, `signing_keys.${column}`, which, 'is not what the log says');
    }
  }
}
