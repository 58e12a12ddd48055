import {
  CONTEXTS,
  CredentialSchema,
  TYPES,
  type Credential,
} from '#evidence/credential/credential-shape.ts';
import { uuidOfOrigin } from '#evidence/log/origin.ts';
import { readShape } from '#evidence/shape/read-shape.ts';

/** What a warranty says; texts as they are to be read. */
export type Warranted = {
  /** A random UUID for this credential. */
  id: string;
  /** The log's origin; the issuer's id is made from it. */
  origin: string;
  issuerName: string;
  validFrom: string;
  /** The last instant in force. */
  validUntil: string;
  instrument: string;
  work: string;
  term: string;
  /** Eleven signs, as drawn. */
  code: string;
};

/**
 * The payload of a warranty's credential (W3C VC Data Model 2.0).
 * @throws ShapeError when an instant, the code, the origin or the UUID is not in its form, or the
 *   term ends before it begins
 */
export function credentialPayload(warranted: Warranted): Credential {
  const { id, origin, issuerName, validFrom, validUntil } = warranted;
  const { instrument, work, term, code } = warranted;
  const payload = {
    '@context': [...CONTEXTS],
    id: `urn:uuid:${id}`,
    type: [...TYPES],
    issuer: { id: `urn:uuid:${uuidOfOrigin(origin)}`, name: issuerName },
    validFrom,
    validUntil,
    credentialSubject: { instrument, work, term, code },
  };
  return readShape(CredentialSchema, payload, 'credential');
}
