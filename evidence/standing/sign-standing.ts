import type { JwsSigner } from '#evidence/credential/sign-credential.ts';
import { signCompactJws } from '#evidence/jws/compact-jws.ts';
import { readShape } from '#evidence/shape/read-shape.ts';
import {
  STANDING_HEADER,
  StandingSchema,
  type Standing,
} from '#evidence/standing/standing-shape.ts';

/**
 * Signs a standing with the credential key: a compact JWS with alg, typ and kid alone.
 * @throws ShapeError when a member is not in its form
 */
export function signStanding(standing: Standing, signer: JwsSigner): string {
  const payload = readShape(StandingSchema, standing, 'standing');
  return signCompactJws({ ...STANDING_HEADER, kid: signer.keyId }, payload, signer.secretKey);
}
