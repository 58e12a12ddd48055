import { createPublicKey, generateKeyPairSync, sign, verify } from 'node:crypto';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { KeyError } from '#evidence/errors.ts';
import { ed25519FromSpki, ed25519Spki } from '#evidence/key/ed25519-spki.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { keyId } from '#evidence/key/key-id.ts';
import { isRsa3072 } from '#evidence/key/rsa-3072.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { verifyEd25519 } from '#evidence/key/verify-ed25519.ts';

const secret = new Uint8Array(32).fill(7);

test('Node reads our public key and checks our signatures, and we check its', () => {
  const spki = ed25519Spki(ed25519PublicKey(secret));
  const publicKey = createPublicKey({ key: Buffer.from(spki), format: 'der', type: 'spki' });
  const message = Buffer.from('witness mark');
  expect(verify(null, message, publicKey, signEd25519(message, secret))).toBe(true);

  const pair = generateKeyPairSync('ed25519');
  const theirs = ed25519FromSpki(pair.publicKey.export({ format: 'der', type: 'spki' }));
  expect(verifyEd25519(sign(null, message, pair.privateKey), message, theirs)).toBe(true);
  expect(ed25519FromSpki(spki)).toEqual(ed25519PublicKey(secret));
});

test('every flipped bit of signature, message or key is refused', () => {
  const message = new TextEncoder().encode('as it went together before');
  const publicKey = ed25519PublicKey(secret);
  const signature = signEd25519(message, secret);
  fc.assert(
    fc.property(fc.constantFrom('signature', 'message', 'key'), fc.nat(511), (which, bit) => {
      const flip = (bytes: Uint8Array) =>
        bytes.map((byte, at) =>
          at === (bit >> 3) % bytes.length ? byte ^ (1 << (bit & 7)) : byte,
        );
      const damaged = verifyEd25519(
        which === 'signature' ? flip(signature) : signature,
        which === 'message' ? flip(message) : message,
        which === 'key' ? flip(publicKey) : publicKey,
      );
      expect(damaged).toBe(false);
    }),
    { numRuns: 150 },
  );
  expect(verifyEd25519(signature, message, publicKey)).toBe(true);
});

test('keys of another length or kind are refused in words', () => {
  expect(() => signEd25519(secret, new Uint8Array(64))).toThrow(KeyError);
  expect(() => ed25519PublicKey(new Uint8Array(31))).toThrow(KeyError);
  expect(() => ed25519Spki(new Uint8Array(33))).toThrow(KeyError);
  const x25519 = generateKeyPairSync('x25519').publicKey.export({ format: 'der', type: 'spki' });
  expect(() => ed25519FromSpki(x25519)).toThrow(KeyError);
  expect(verifyEd25519(new Uint8Array(63), secret, secret)).toBe(false);
});

test('an RSA key is told by its modulus, and a key id is 32 hex', () => {
  const spki = (modulusLength: number) =>
    generateKeyPairSync('rsa', { modulusLength }).publicKey.export({ format: 'der', type: 'spki' });
  expect(isRsa3072(spki(3072))).toBe(true);
  expect(isRsa3072(spki(2048))).toBe(false);
  expect(isRsa3072(ed25519Spki(secret))).toBe(false);
  expect(isRsa3072(Uint8Array.of(0x30, 0x80))).toBe(false);
  expect(keyId(spki(2048))).toMatch(/^[0-9a-f]{32}$/);
});
