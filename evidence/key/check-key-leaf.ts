import { fromBase64 } from '#evidence/bytes/base64.ts';
import { equal } from '#evidence/bytes/equal.ts';
import type { KeyShown } from '#evidence/chain/log-shown.ts';
import { KeyError } from '#evidence/errors.ts';
import { certificateSpki } from '#evidence/key/certificate-spki.ts';
import { ed25519FromSpki } from '#evidence/key/ed25519-spki.ts';
import { keyId } from '#evidence/key/key-id.ts';
import { isRsa3072 } from '#evidence/key/rsa-3072.ts';
import { encodeVkey, LOG_TYPE, WITNESS_TYPE } from '#evidence/note/vkey.ts';

/** The vkey a key must have for its use: the log's under its origin, the witness's beside it. */
export function vkeyOfUse(use: KeyShown['use'], spki: Uint8Array, origin: string): string | null {
  if (use !== 'log' && use !== 'witness') return null;
  const publicKey = ed25519FromSpki(spki);
  return use === 'log'
    ? encodeVkey({ name: origin, type: LOG_TYPE, publicKey })
    : encodeVkey({ name: `${origin}/witness`, type: WITNESS_TYPE, publicKey });
}

/**
 * Holds what a `key` leaf shows against itself: id and vkey are those of its key, the algorithm is
 * the one its use takes, a paper key has its certificate and no other key has one.
 * @param origin the log's origin, which names log and witness keys in notes
 * @throws KeyError naming what does not agree
 */
export function checkKeyLeaf(shown: KeyShown, origin: string): void {
  const spki = fromBase64(shown.spki);
  if (shown.id !== keyId(spki)) throw new KeyError('The id of a key is not that of its bytes.');
  const paper = shown.use === 'paper';
  if (shown.alg !== (paper ? 'RSA-3072' : 'Ed25519')) {
    throw new KeyError(`A key for use "${shown.use}" has another algorithm.`);
  }
  if (paper ? !isRsa3072(spki) : ed25519FromSpki(spki).length !== 32) {
    throw new KeyError('A key is not of the algorithm its leaf names.');
  }
  if (shown.vkey !== vkeyOfUse(shown.use, spki, origin)) {
    throw new KeyError('The vkey of a key is not that of its bytes and use.');
  }
  if ((shown.cert !== null) !== paper) {
    throw new KeyError('A paper key has a certificate; no other key has one.');
  }
  if (shown.cert !== null && !equal(certificateSpki(fromBase64(shown.cert)), spki)) {
    throw new KeyError('The certificate of a paper key is for another key.');
  }
}
