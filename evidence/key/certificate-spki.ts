import { KeyError } from '#evidence/errors.ts';
import { readDer } from '#evidence/key/read-der.ts';

const SEQUENCE = 0x30;
const EXPLICIT_VERSION = 0xa0;

/**
 * The DER SubjectPublicKeyInfo inside one X.509 certificate (RFC 5280 §4.1). Nothing else of the
 * certificate is judged.
 * @throws KeyError when the bytes are not exactly one certificate
 */
export function certificateSpki(certificate: Uint8Array): Uint8Array {
  const [outer, ...rest] = readDer(certificate);
  if (outer?.tag !== SEQUENCE || rest.length > 0) throw new KeyError('This is not a certificate.');
  const body = readDer(outer.content)[0];
  if (body?.tag !== SEQUENCE) throw new KeyError('This is not a certificate.');
  const fields = readDer(body.content);
  // version (absent in the oldest), serial, algorithm, issuer, validity, subject, then the key
  const spki = fields[fields[0]?.tag === EXPLICIT_VERSION ? 6 : 5];
  if (spki?.tag !== SEQUENCE) throw new KeyError('This certificate holds no public key.');
  return spki.whole;
}
