import { describe, expect, test } from 'vitest';
import { toBase64url } from '#evidence/bytes/base64url.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { credentialPayload } from '#evidence/credential/credential-payload.ts';
import { readCredential } from '#evidence/credential/read-credential.ts';
import { signCredential } from '#evidence/credential/sign-credential.ts';
import { ShapeError, SignatureError } from '#evidence/errors.ts';
import { signCompactJws } from '#evidence/jws/compact-jws.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { originOf } from '#evidence/log/origin.ts';
import { idOf, secretOf, UUID } from '#tests/evidence/witness-shop.ts';

const secretKey = secretOf('credential');
const keyId = idOf(secretKey);
const publicKeyOf = (kid: string) => (kid === keyId ? ed25519PublicKey(secretKey) : null);
const warranted = {
  id: '9b6c1e2a-50d4-4c1f-8a77-2f3e4d5c6b7a',
  origin: originOf(UUID),
  issuerName: 'Wrenfield Instrument Repair',
  validFrom: '2026-05-02T00:00:00.000Z',
  validUntil: '2028-05-01T23:59:59.999Z',
  instrument: 'Parlour guitar, Aldous Pike, 0417',
  work: 'Bridge reglued, top crack cleated',
  term: '24 months',
  code: '00000000000',
};
const payload = credentialPayload(warranted);
const header = { alg: 'Ed25519', typ: 'vc+jwt', cty: 'vc', kid: keyId };
const jws = signCredential(payload, { keyId, secretKey });

test('a credential reads back', () => {
  expect(readCredential(jws, publicKeyOf)).toEqual({ payload, kid: keyId, unknownMembers: [] });
  expect(payload.issuer.id).toBe(`urn:uuid:${UUID}`);
});

describe('its header', () => {
  test.each([
    ['another algorithm', { alg: 'EdDSA' }],
    ['no algorithm', { alg: 'none' }],
    ['another type', { typ: 'JWT' }],
    ['another content type', { cty: 'json' }],
    ['no key id', { kid: undefined }],
    ['an unknown key', { kid: idOf(secretOf('another')) }],
    ['critical extensions', { crit: ['b64'], b64: true }],
  ])('with %s is refused', (_, change) => {
    const changed = JSON.parse(JSON.stringify({ ...header, ...change })) as object;
    expect(() => readCredential(signCompactJws(changed, payload, secretKey), publicKeyOf)).toThrow(
      SignatureError,
    );
  });

  test('a key it brings along is not looked at', () => {
    const theirs = secretOf('forger');
    const jwk = { kty: 'OKP', crv: 'Ed25519', x: toBase64url(ed25519PublicKey(theirs)) };
    const brought = { ...header, jwk, jku: 'https://example.org', x5u: 'https://example.org' };
    expect(() => readCredential(signCompactJws(brought, payload, theirs), publicKeyOf)).toThrow(
      SignatureError,
    );
    const ignored = readCredential(signCompactJws(brought, payload, secretKey), publicKeyOf);
    expect(ignored.unknownMembers).toEqual([]);
  });
});

describe('its payload', () => {
  const signed = (change: object) => signCompactJws(header, { ...payload, ...change }, secretKey);

  test.each(['iss', 'iat', 'exp', 'nbf', 'jti', 'vc', 'credentialStatus'])('refuses %s', (name) => {
    expect(() => readCredential(signed({ [name]: 1 }), publicKeyOf)).toThrow(ShapeError);
  });

  test('refuses an id of its subject, and reports what else it does not know', () => {
    const subject = payload.credentialSubject;
    const withId = signed({ credentialSubject: { ...subject, id: 'did:example:a' } });
    expect(() => readCredential(withId, publicKeyOf)).toThrow(ShapeError);
    const withMore = signed({ evidence: [], credentialSubject: { ...subject, colour: 'amber' } });
    expect(readCredential(withMore, publicKeyOf)).toMatchObject({
      payload,
      unknownMembers: ['evidence', 'credentialSubject.colour'],
    });
  });

  test.each([
    ['another context', { '@context': payload['@context'].toReversed() }],
    ['another type', { type: ['VerifiableCredential'] }],
    ['a term that ends before it begins', { validUntil: '2026-05-01T00:00:00.000Z' }],
    ['a date for an instant', { validFrom: '2026-05-02' }],
    ['an issuer by address', { issuer: 'https://wrenfield.example' }],
    [
      'a code with hyphens',
      { credentialSubject: { ...payload.credentialSubject, code: '0000-0000-000' } },
    ],
    ['no subject', { credentialSubject: null }],
  ])('refuses %s', (_, change) => {
    expect(() => readCredential(signed(change), publicKeyOf)).toThrow(ShapeError);
  });

  test('what cannot be read back cannot be made', () => {
    for (const change of [
      { code: '00000000001' },
      { validFrom: '2029-01-01T00:00:00.000Z' },
      { id: 'x' },
    ]) {
      expect(() => credentialPayload({ ...warranted, ...change })).toThrow(ShapeError);
    }
    expect(() => originOf('3f2a9c64-7d1b-1e08-9a55-0c6be1d2f713')).toThrow(ShapeError);
  });
});

describe('its frame', () => {
  const [head, body, tail] = jws.split('.') as [string, string, string];

  test.each([
    ['two segments', `${head}.${body}`],
    ['four segments', `${jws}.${tail}`],
    ['an empty signature', `${head}.${body}.`],
    ['padding', `${head}.${body}.${tail}==`],
    ['another payload', `${head}.${toBase64url(toUtf8('{}'))}.${tail}`],
    ['a payload that is no object', `${head}.${toBase64url(toUtf8('[]'))}.${tail}`],
    ['nothing', ''],
  ])('%s is refused', (_, text) => {
    expect(() => readCredential(text, publicKeyOf)).toThrow(SignatureError);
  });

  test('a member given twice is refused, though well signed', () => {
    const text = JSON.stringify(payload).replace('{', '{"id":"urn:uuid:x",');
    const signed = `${head}.${toBase64url(toUtf8(text))}`;
    const twice = `${signed}.${toBase64url(signEd25519(toUtf8(signed), secretKey))}`;
    expect(() => readCredential(twice, publicKeyOf)).toThrow(SignatureError);
  });

  test('every changed sign is refused', () => {
    for (let at = 0; at < jws.length; at += 7) {
      const sign = jws[at] === 'A' ? 'B' : 'A';
      const changed = jws.slice(0, at) + sign + jws.slice(at + 1);
      expect(() => readCredential(changed, publicKeyOf)).toThrow(SignatureError);
    }
  });
});
