import { expect, test } from 'vitest';
import { fromBase64url, toBase64url } from '#evidence/bytes/base64url.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { canonicalText } from '#evidence/json/canonical-text.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { verifyEd25519 } from '#evidence/key/verify-ed25519.ts';
import { checkValues } from '#tests/outside/check-values.ts';

type Jwk = { [member: string]: string };

/** Whether the last segment of a compact JWS is an Ed25519 signature of the first two. */
function signed(compact: string, x: string): boolean {
  const [head, body, tail] = compact.split('.') as [string, string, string];
  // Node's lenient decoder, so that the signature is judged and not only its spelling.
  const signature = Uint8Array.from(Buffer.from(tail, 'base64url'));
  return verifyEd25519(signature, toUtf8(`${head}.${body}`), fromBase64url(x));
}

test.each(
  checkValues<{ private_jwk: Jwk; header_json: string; payload: string }, { compact: string }>(
    'jws',
    'crypto.jws',
  ),
)('$id ($source)', ({ inputs: { private_jwk, header_json, payload }, expected }) => {
  const secret = fromBase64url(private_jwk.d!);
  expect(toBase64url(ed25519PublicKey(secret))).toBe(private_jwk.x);
  const text = [header_json, payload].map((part) => toBase64url(toUtf8(part))).join('.');
  const compact = `${text}.${toBase64url(signEd25519(toUtf8(text), secret))}`;
  expect(compact).toBe(expected.compact);
  expect(signed(compact, private_jwk.x!)).toBe(true);
});

test.each(
  checkValues<{ compact: string; public_jwk: Jwk }, { valid: boolean }>(
    'jws',
    'crypto.jws_negative',
  ),
)('$id ($source)', ({ inputs: { compact, public_jwk }, expected }) => {
  expect(signed(compact, public_jwk.x!)).toBe(expected.valid);
});

// RFC 7638 hashes the canonical form of a key's required members.
const REQUIRED: Record<string, string[]> = { OKP: ['crv', 'kty', 'x'], RSA: ['e', 'kty', 'n'] };

test.each(
  checkValues<{ public_jwk: Jwk }, { thumbprint_b64url: string }>('jws', 'crypto.jwk_thumbprint'),
)('$id ($source)', ({ inputs: { public_jwk }, expected }) => {
  const members = REQUIRED[public_jwk.kty!]!.map((name) => [name, public_jwk[name]!]);
  const text = canonicalText(Object.fromEntries(members) as Jwk);
  expect(toBase64url(sha256(toUtf8(text)))).toBe(expected.thumbprint_b64url);
});
