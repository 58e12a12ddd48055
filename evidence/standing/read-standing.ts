import { SignatureError } from '#evidence/errors.ts';
import { readCompactJws } from '#evidence/jws/compact-jws.ts';
import { readShape } from '#evidence/shape/read-shape.ts';
import {
  STANDING_HEADER,
  StandingSchema,
  type Standing,
} from '#evidence/standing/standing-shape.ts';

/**
 * Reads a standing; whether its word follows from the record is for the caller.
 * @param publicKeyOf the 32-byte key of a key id, from the log's key leaves; null when unknown
 * @throws SignatureError when the header is not exactly alg, typ and kid, or key or signature do
 *   not hold; ShapeError when the payload is not exactly a standing
 */
export function readStanding(
  jws: string,
  publicKeyOf: (kid: string) => Uint8Array | null,
): { standing: Standing; kid: string } {
  const { header, payload, signedBy } = readCompactJws(jws);
  const { alg, typ, kid, ...others } = header;
  const asFixed = alg === STANDING_HEADER.alg && typ === STANDING_HEADER.typ;
  if (!asFixed || typeof kid !== 'string' || Object.keys(others).length > 0) {
    throw new SignatureError('This standing is not signed in the way ours are.');
  }
  const publicKey = publicKeyOf(kid);
  if (!publicKey) throw new SignatureError('The log lists no credential key of this id.');
  if (!signedBy(publicKey)) throw new SignatureError('The standing’s signature does not hold.');
  return { standing: readShape(StandingSchema, payload, 'standing'), kid };
}
