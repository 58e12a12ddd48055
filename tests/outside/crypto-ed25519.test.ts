import { createPublicKey, verify } from 'node:crypto';
import { ed25519 } from '@noble/curves/ed25519.js';
import { expect, test } from 'vitest';
import { concat } from '#evidence/bytes/concat.ts';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { ed25519Spki } from '#evidence/key/ed25519-spki.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { verifyEd25519 } from '#evidence/key/verify-ed25519.ts';
import { checkValues } from '#tests/outside/check-values.ts';

test.each(
  checkValues<
    { seed_hex: string; message_hex: string },
    { public_hex: string; signature_hex: string }
  >('ed25519', 'crypto.ed25519'),
)('$id ($source)', ({ inputs, expected }) => {
  const [seed, message] = [fromHex(inputs.seed_hex), fromHex(inputs.message_hex)];
  const publicKey = ed25519PublicKey(seed);
  expect(toHex(publicKey)).toBe(expected.public_hex);
  const signature = signEd25519(message, seed);
  expect(toHex(signature)).toBe(expected.signature_hex);
  expect(verifyEd25519(signature, message, publicKey)).toBe(true);
  const spki = Buffer.from(ed25519Spki(publicKey));
  const nodeKey = createPublicKey({ key: spki, format: 'der', type: 'spki' });
  expect(verify(null, message, nodeKey, signature)).toBe(true);
});

test.each(
  checkValues<
    { message_hex: string; public_hex: string; signature_hex: string },
    { valid: boolean; because: string }
  >('ed25519-edges', 'crypto.ed25519_edge'),
)('$id: $expected.because ($source)', ({ inputs, expected }) => {
  const { message_hex, public_hex, signature_hex } = inputs;
  const valid = verifyEd25519(fromHex(signature_hex), fromHex(message_hex), fromHex(public_hex));
  expect(valid).toBe(expected.valid);
});

test.each(
  checkValues<
    { public_hex: string; message_hex: string; signature_hex: string },
    { valid: boolean }
  >('ed25519', 'crypto.ed25519_negative'),
)('$id ($source)', ({ inputs, expected }) => {
  const { public_hex, message_hex, signature_hex } = inputs;
  const valid = verifyEd25519(fromHex(signature_hex), fromHex(message_hex), fromHex(public_hex));
  expect(valid).toBe(expected.valid);
});

// All encodings of points of small order, from the list in C2SP/CCTV, ed25519/README.md.
const SMALL_ORDER = [
  '0000000000000000000000000000000000000000000000000000000000000000',
  'edffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff7f',
  '0000000000000000000000000000000000000000000000000000000000000080',
  'edffffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff',
  '0100000000000000000000000000000000000000000000000000000000000000',
  '0100000000000000000000000000000000000000000000000000000000000080',
  'eeffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff7f',
  'eeffffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff',
  '26e8958fc2b227b045c3f489f2ef98f0d5dfac05d3c63339b13802886d53fc05',
  '26e8958fc2b227b045c3f489f2ef98f0d5dfac05d3c63339b13802886d53fc85',
  'c7176a703d4dd84fba3c0b760d10670f2a2053fa2c39ccc64ec7fd7792ac037a',
  'c7176a703d4dd84fba3c0b760d10670f2a2053fa2c39ccc64ec7fd7792ac03fa',
  'ecffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff7f',
  'ecffffffffffffffffffffffffffffffffffffffffffffffffffffffffffffff',
].map((hex) => fromHex(hex));

test('no key of small order signs anything, whichever way it is written', () => {
  const message = new Uint8Array(0);
  for (const publicKey of SMALL_ORDER) {
    for (const r of SMALL_ORDER) {
      const signature = concat(r, new Uint8Array(32));
      // The lenient reading of ZIP 215 takes every one of them, so there is something to refuse.
      expect(ed25519.verify(signature, message, publicKey, { zip215: true })).toBe(true);
      expect(verifyEd25519(signature, message, publicKey)).toBe(false);
    }
  }
});
