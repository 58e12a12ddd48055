import { isCode } from '#evidence/code/crockford.ts';
import { InstantSchema } from '#evidence/shape/scalars.ts';
import { z } from '#evidence/shape/zod.ts';

export const CONTEXTS = [
  'https://www.w3.org/ns/credentials/v2',
  'https://www.w3.org/ns/credentials/undefined-terms/v2',
] as const;
export const TYPES = ['VerifiableCredential', 'WitnessmarkWarranty'] as const;
/** The protected header, but for the key id. */
export const HEADER = { alg: 'Ed25519', typ: 'vc+jwt', cty: 'vc' } as const;
/**
 * Members that would say a second time, in another way, what the payload or the log says, or point
 * at a person or at a list that somebody else keeps.
 */
export const REFUSED = ['iss', 'iat', 'exp', 'nbf', 'jti', 'vc', 'credentialStatus'] as const;

const UrnUuidSchema = z
  .string()
  .check(z.regex(/^urn:uuid:[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/));
const exactly = (texts: readonly string[]) =>
  z.array(z.string()).check(z.refine((list) => list.join('\n') === texts.join('\n')));

/** What is warranted; no id and no person, so that it can be passed on with the instrument. */
export const SubjectSchema = z.strictObject({
  instrument: z.string(),
  work: z.string(),
  term: z.string(),
  code: z.string().check(z.refine(isCode)),
});
export const IssuerSchema = z.strictObject({ id: UrnUuidSchema, name: z.string() });

/** The payload of a warranty's credential. */
export const CredentialSchema = z
  .strictObject({
    '@context': exactly(CONTEXTS),
    id: UrnUuidSchema,
    type: exactly(TYPES),
    issuer: IssuerSchema,
    validFrom: InstantSchema,
    validUntil: InstantSchema,
    credentialSubject: SubjectSchema,
  })
  // Instants of one form compare as text.
  .check(z.refine(({ validFrom, validUntil }) => validFrom <= validUntil));
export type Credential = z.output<typeof CredentialSchema>;
