import { execFileSync } from 'node:child_process';
import { chmodSync, readdirSync, readFileSync, renameSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { ed25519FromSpki } from '#evidence/key/ed25519-spki.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { verifyEd25519 } from '#evidence/key/verify-ed25519.ts';
import { select } from '#server/db/sql.ts';
import { env } from '#server/env.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { currentKey, publicKeys } from './current-key.ts';
import { refuseDemoKeysInPublic } from './demo-keys.ts';
import { readKeyFile } from './key-files.ts';
import { keySet } from './key-set.ts';
import { openLog } from './open-log.ts';
import { signingKey } from './signing-key.ts';

useDatabase();

const pathOf = (use: string, id: string) => join(env().KEYS_DIR, `${use}-${id}.pem`);

beforeAll(() => openLog());

describe('the shop’s keys', () => {
  it('are three files that only this account can read', async () => {
    const keys = await publicKeys();
    expect(keys.map(({ use, alg }) => [use, alg])).toEqual([
      ['log', 'Ed25519'],
      ['credential', 'Ed25519'],
      ['paper', 'RSA-3072'],
    ]);
    expect(statSync(env().KEYS_DIR).mode & 0o777).toBe(0o700);
    for (const { use, id } of keys) expect(statSync(pathOf(use, id)).mode & 0o777).toBe(0o600);
  });

  it('have no private part in the database', async () => {
    const tables = await select<{ name: string }>(
      'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE()',
    );
    const dump = (
      await Promise.all(tables.map(({ name }) => select<object>(`SELECT * FROM \`${name}\``)))
    ).flatMap((rows) => rows.flatMap((row) => Object.values(row) as unknown[]));
    const held = Buffer.concat(
      dump.map((value) => (Buffer.isBuffer(value) ? value : Buffer.from(String(value)))),
    );
    for (const { use, id } of await publicKeys()) {
      const { privateKey } = readKeyFile(use as 'log', id);
      const { d } = privateKey.export({ format: 'jwk' });
      expect(d!.length).toBeGreaterThan(40);
      const raw = Buffer.from(d!, 'base64url');
      for (const form of [raw, Buffer.from(d!), Buffer.from(raw.toString('hex'))]) {
        expect(held.includes(form), use).toBe(false);
      }
    }
  });

  it('sign what their published halves verify', async () => {
    for (const use of ['log', 'credential'] as const) {
      const { keyId, secretKey } = await signingKey(use);
      const { id, spki } = await currentKey(use);
      expect(keyId).toBe(id);
      const message = new Uint8Array(Buffer.from('a message'));
      const signature = signEd25519(message, secretKey);
      expect(verifyEd25519(signature, message, ed25519FromSpki(spki))).toBe(true);
      const listed = (await keySet()).keys.find(({ kid }) => kid === id);
      expect(listed).toMatchObject({ kty: 'OKP', crv: 'Ed25519', use: 'sig', alg: 'Ed25519' });
      expect(Buffer.from(listed!.x!, 'base64url')).toEqual(Buffer.from(ed25519FromSpki(spki)));
      expect(listed).not.toHaveProperty('d');
    }
  });

  it('come with a certificate for papers that openssl verifies and that may only sign', async () => {
    const { certificate } = await currentKey('paper');
    const file = join(env().KEYS_DIR, 'paper.der');
    const pem = join(env().KEYS_DIR, 'paper.pem');
    writeFileSync(file, certificate!);
    const openssl = (...args: string[]) => execFileSync('openssl', args, { encoding: 'utf8' });
    openssl('x509', '-inform', 'DER', '-in', file, '-out', pem);
    expect(openssl('verify', '-check_ss_sig', '-CAfile', pem, pem)).toBe(`${pem}: OK\n`);
    const text = openssl('x509', '-in', pem, '-noout', '-text');
    expect(text).toContain('Public-Key: (3072 bit)');
    expect(text).toContain('Signature Algorithm: sha256WithRSAEncryption');
    expect(text).toContain('CA:FALSE');
    expect(text).toMatch(/Key Usage: critical\s+Digital Signature, Non Repudiation/);
  });

  it('are refused when lost, readable by others, or another key’s', async () => {
    const { id } = await currentKey('log');
    const path = pathOf('log', id);
    chmodSync(path, 0o644);
    await expect(signingKey('log')).rejects.toThrow(`${path} can be read by others.`);
    chmodSync(path, 0o600);
    renameSync(path, `${path}.away`);
    await expect(signingKey('log')).rejects.toThrow(
      `The private log key is missing. Put ${path} back from its copy.`,
    );
    const { id: other } = await currentKey('credential');
    writeFileSync(path, readFileSync(pathOf('credential', other)), { mode: 0o600 });
    await expect(signingKey('log')).rejects.toThrow(`${path} holds another key.`);
    renameSync(`${path}.away`, path);
    expect((await signingKey('log')).keyId).toBe(id);
  });

  it('of a demonstration are refused where others can reach the address', () => {
    expect(readdirSync(env().KEYS_DIR)).toContain('DEMO-KEYS.txt');
    expect(() => refuseDemoKeysInPublic('http://127.0.0.1:3000')).not.toThrow();
    expect(() => refuseDemoKeysInPublic('https://shop.example')).toThrow(
      'were made for a demonstration and PUBLIC_URL can be reached by others.',
    );
  });
});
