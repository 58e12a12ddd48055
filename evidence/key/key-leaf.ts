import { toBase64 } from '#evidence/bytes/base64.ts';
import type { KeyShown, KeyUse } from '#evidence/chain/log-shown.ts';
import { checkKeyLeaf, vkeyOfUse } from '#evidence/key/check-key-leaf.ts';
import { keyId } from '#evidence/key/key-id.ts';

/**
 * What a `key` leaf shows.
 * @param key what the key is for and what happens to it; its DER SubjectPublicKeyInfo; the log's
 *   origin; for use `paper` the DER certificate; why, or null
 * @throws KeyError when key, use and certificate do not go together
 */
export function keyLeaf(key: {
  use: KeyUse;
  act: KeyShown['act'];
  spki: Uint8Array;
  origin: string;
  cert?: Uint8Array;
  reason: string | null;
}): KeyShown {
  const { use, act, spki, origin, cert, reason } = key;
  const shown: KeyShown = {
    v: 1,
    use,
    act,
    id: keyId(spki),
    alg: use === 'paper' ? 'RSA-3072' : 'Ed25519',
    spki: toBase64(spki),
    vkey: vkeyOfUse(use, spki, origin),
    cert: cert ? toBase64(cert) : null,
    reason,
  };
  checkKeyLeaf(shown, origin);
  return shown;
}
