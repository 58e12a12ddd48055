import { HEADER, type Credential } from '#evidence/credential/credential-shape.ts';
import { signCompactJws } from '#evidence/jws/compact-jws.ts';

/** The credential key: its id as 32 hex, and the 32-byte Ed25519 secret. */
export type JwsSigner = { keyId: string; secretKey: Uint8Array };

/** Signs a credential: a compact JWS with alg Ed25519 (RFC 9864), typ vc+jwt, cty vc and kid. */
export function signCredential(payload: Credential, signer: JwsSigner): string {
  return signCompactJws({ ...HEADER, kid: signer.keyId }, payload, signer.secretKey);
}
