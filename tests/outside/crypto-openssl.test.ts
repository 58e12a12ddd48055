import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { toBase64 } from '#evidence/bytes/base64.ts';
import { ed25519PublicKey } from '#evidence/key/ed25519-public-key.ts';
import { ed25519Spki } from '#evidence/key/ed25519-spki.ts';
import { keyId } from '#evidence/key/key-id.ts';
import { stand, tellCase } from '#tests/evidence/told-case.ts';

// OpenSSL as Debian packages it checks our JWS the way anybody could by hand.
const folder = mkdtempSync(join(tmpdir(), 'witnessmark-openssl-'));
const { shop, credential, warranty } = tellCase();
const spki = ed25519Spki(ed25519PublicKey(shop.credentialSecret));
const file = (name: string, content: string | Uint8Array) => {
  const path = join(folder, name);
  writeFileSync(path, content);
  return path;
};
const pem = file(
  'credential.pub',
  `-----BEGIN PUBLIC KEY-----\n${toBase64(spki)}\n-----END PUBLIC KEY-----\n`,
);

afterAll(() => rmSync(folder, { recursive: true, force: true }));

function openssl(args: string[], input?: Uint8Array) {
  const run = spawnSync('openssl', args, { input, encoding: 'utf8' });
  if (run.error) throw new Error('OpenSSL is missing. apt-get install openssl');
  return run;
}

/** Whether `openssl pkeyutl` takes the third segment as a signature of the first two. */
function takes(jws: string): boolean {
  const [head, body, tail] = jws.split('.') as [string, string, string];
  const signed = file('signed', `${head}.${body}`);
  const signature = file('signature', Buffer.from(tail, 'base64url'));
  const key = ['-pubin', '-inkey', pem];
  const run = openssl([
    'pkeyutl',
    '-verify',
    ...key,
    '-rawin',
    '-in',
    signed,
    '-sigfile',
    signature,
  ]);
  expect(run.stdout.trim()).toMatch(
    /^Signature Verified Successfully$|^Signature Verification Failure$/,
  );
  return run.status === 0;
}

test.each([
  ['credential', credential],
  ['standing', stand(shop, warranty)],
])('openssl checks the signature of a %s', (_, jws) => {
  expect(takes(jws)).toBe(true);
  const [head, body, tail] = jws.split('.') as [string, string, string];
  const other = body.startsWith('eyJA') ? `eyJB${body.slice(4)}` : `eyJA${body.slice(4)}`;
  expect(takes(`${head}.${other}.${tail}`)).toBe(false);
});

test('a key id is what openssl’s SHA-256 of the key begins with', () => {
  const der = openssl([
    'pkey',
    '-pubin',
    '-in',
    pem,
    '-outform',
    'DER',
    '-out',
    join(folder, 'der'),
  ]);
  expect(der.status).toBe(0);
  const { stdout } = openssl(['dgst', '-sha256', '-r', join(folder, 'der')]);
  expect(stdout.slice(0, 32)).toBe(keyId(spki));
});
