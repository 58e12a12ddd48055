import { expect, test } from 'vitest';
import { ShapeError, SignatureError } from '#evidence/errors.ts';
import { signCompactJws } from '#evidence/jws/compact-jws.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { readStanding } from '#evidence/standing/read-standing.ts';
import { signStanding } from '#evidence/standing/sign-standing.ts';
import { standingWord } from '#evidence/standing/standing-word.ts';
import { idOf, secretOf } from '#tests/evidence/witness-shop.ts';

const secretKey = secretOf('credential');
const keyId = idOf(secretKey);
const publicKeyOf = (kid: string) => (kid === keyId ? ed25519PublicKey(secretKey) : null);
const hash = '11'.repeat(32);
const standing = {
  seal: hash,
  standing: 'in force' as const,
  at: '2026-06-01T12:00:00.000Z',
  case: '22'.repeat(16),
  seq: 7,
  C: hash,
  ownSeq: 4,
  ownC: hash,
  checkpoint: 'a note',
};
const header = { alg: 'Ed25519', typ: 'witnessmark-standing+jwt', kid: keyId };

test('a standing reads back', () => {
  const jws = signStanding(standing, { keyId, secretKey });
  expect(readStanding(jws, publicKeyOf)).toEqual({ standing, kid: keyId });
});

test('its header is exactly alg, typ and kid', () => {
  for (const change of [
    { cty: 'vc' },
    { typ: 'vc+jwt' },
    { alg: 'EdDSA' },
    { kid: '00' },
    { crit: [] },
  ]) {
    const jws = signCompactJws({ ...header, ...change }, standing, secretKey);
    expect(() => readStanding(jws, publicKeyOf)).toThrow(SignatureError);
  }
  const forged = signCompactJws(header, standing, secretOf('forger'));
  expect(() => readStanding(forged, publicKeyOf)).toThrow(SignatureError);
});

test('its payload is exactly a standing', () => {
  for (const change of [
    { more: 1 },
    { standing: 'void' },
    { at: 'today' },
    { seq: -1 },
    { ownC: null },
  ]) {
    const jws = signCompactJws(header, { ...standing, ...change }, secretKey);
    expect(() => readStanding(jws, publicKeyOf)).toThrow(ShapeError);
  }
});

test.each([
  ['in force', [], 'before'],
  ['ended', [], 'after'],
  ['ended', ['suspend', 'resume'], 'after'],
  ['suspended', ['suspend'], 'after'],
  ['suspended', ['suspend', 'transfer'], 'before'],
  ['in force', ['transfer'], 'before'],
  ['withdrawn', ['suspend', 'withdraw'], 'after'],
  ['withdrawn', ['withdraw', 'resume', 'replace'], 'before'],
  ['replaced', ['replace', 'withdraw'], 'before'],
] as const)('%s after %j, %s the end of the term', (word, acts, when) => {
  const until = '2028-05-01T23:59:59.999Z';
  const at = when === 'before' ? until : '2028-05-02T00:00:00.000Z';
  expect(standingWord(acts, until, at)).toBe(word);
});
