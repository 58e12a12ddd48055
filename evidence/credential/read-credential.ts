import {
  CredentialSchema,
  HEADER,
  IssuerSchema,
  REFUSED,
  SubjectSchema,
  type Credential,
} from '#evidence/credential/credential-shape.ts';
import { ShapeError, SignatureError } from '#evidence/errors.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { readCompactJws } from '#evidence/jws/compact-jws.ts';
import { readShape } from '#evidence/shape/read-shape.ts';

/** A credential whose signature holds; `unknownMembers` are those this program cannot judge. */
export type ReadCredential = { payload: Credential; kid: string; unknownMembers: string[] };

/**
 * Reads a warranty's credential. Header members besides alg, typ, cty and kid are ignored, `crit`
 * is refused; no key is ever taken from the header.
 * @param publicKeyOf the 32-byte key of a key id, from the log's key leaves; null when unknown
 * @throws SignatureError when frame, algorithm, key or signature do not hold; ShapeError when the
 *   payload lacks a member, has one of another form, or one that is refused
 */
export function readCredential(
  jws: string,
  publicKeyOf: (kid: string) => Uint8Array | null,
): ReadCredential {
  const { header, payload, signedBy } = readCompactJws(jws);
  const kid = header.kid;
  const asFixed = Object.entries(HEADER).every(([name, value]) => header[name] === value);
  if (!asFixed || typeof kid !== 'string' || Object.hasOwn(header, 'crit')) {
    throw new SignatureError('This credential is not signed in the way ours are.');
  }
  const publicKey = publicKeyOf(kid);
  if (!publicKey) throw new SignatureError('The log lists no credential key of this id.');
  if (!signedBy(publicKey)) throw new SignatureError('The credential’s signature does not hold.');
  return { kid, ...readPayload(payload) };
}

function readPayload(payload: Record<string, JsonValue>) {
  const unknownMembers: string[] = [];
  const known = (value: JsonValue | undefined, names: string[], path: string): JsonValue => {
    if (typeof value !== 'object' || value === null || Array.isArray(value)) return null;
    const members = Object.entries(value);
    unknownMembers.push(...members.flatMap(([name]) => (names.includes(name) ? [] : path + name)));
    return Object.fromEntries(members.filter(([name]) => names.includes(name)));
  };
  const subject = payload.credentialSubject;
  const inSubject = typeof subject === 'object' && subject && Object.hasOwn(subject, 'id');
  const refused = REFUSED.find((name) => Object.hasOwn(payload, name));
  if (refused || inSubject) {
    throw new ShapeError('The credential has a member that is refused.', refused ?? 'id');
  }
  const top = known(payload, Object.keys(CredentialSchema.shape), '') as Record<string, JsonValue>;
  const value = {
    ...top,
    issuer: known(payload.issuer, Object.keys(IssuerSchema.shape), 'issuer.'),
    credentialSubject: known(subject, Object.keys(SubjectSchema.shape), 'credentialSubject.'),
  };
  return { payload: readShape(CredentialSchema, value, 'credential'), unknownMembers };
}
