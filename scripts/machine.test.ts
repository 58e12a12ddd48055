import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import {
  aptPrefix,
  missingPackages,
  npmPackagesMatch,
  requireNode,
  requireSpace,
} from './machine.mjs';

describe('requireNode', () => {
  it.each(['v20.0.0', 'v20.20.2', 'v24.1.0'])('accepts %s', (version) => {
    expect(() => requireNode(version)).not.toThrow();
  });

  it.each(['v18.20.4', 'v8.0.0', 'v2.0.0'])('refuses %s in one sentence', (version) => {
    expect(() => requireNode(version)).toThrow(
      `Node.js 20 or newer is needed; this is ${version}. Install a newer one, then run the same command again.`,
    );
  });
});

describe('requireSpace', () => {
  it('says that the disk is full when less is free than needed', () => {
    expect(() => requireSpace(tmpdir(), 1)).not.toThrow();
    expect(() => requireSpace(tmpdir(), 2 ** 60)).toThrow(/^The disk is full\. Free about 1 GB/);
  });
});

describe('Debian packages', () => {
  const packages = { openssl: '/usr/bin/openssl', qpdf: '/usr/bin/qpdf' };

  it('names those whose file is missing', () => {
    expect(missingPackages(packages, (path) => path.endsWith('openssl'))).toEqual(['qpdf']);
  });

  it('needs nothing before apt-get as root, sudo otherwise, and a sentence without either', () => {
    expect(aptPrefix(['qpdf'], { uid: 0, sudo: false })).toEqual([]);
    expect(aptPrefix(['qpdf'], { uid: 1000, sudo: true })).toEqual(['sudo']);
    expect(() => aptPrefix(['qpdf', 'openssl'], { uid: 1000, sudo: false })).toThrow(
      'Debian packages are missing and this user may not install them. As root, run: apt-get install -y qpdf openssl',
    );
  });
});

describe('npmPackagesMatch', () => {
  let root = '';
  const lock = {
    '': { version: '1.0.0' },
    'node_modules/a': { version: '1.2.3' },
    'node_modules/for-another-system': { version: '1.0.0', optional: true },
  };

  async function write(noted?: object) {
    await writeFile(join(root, 'package-lock.json'), JSON.stringify({ packages: lock }));
    await mkdir(join(root, 'node_modules'), { recursive: true });
    const path = join(root, 'node_modules/.package-lock.json');
    if (noted) await writeFile(path, JSON.stringify({ packages: noted }));
  }

  beforeEach(async () => {
    root = await mkdtemp(join(tmpdir(), 'witnessmark-npm-'));
  });

  afterEach(() => rm(root, { recursive: true }));

  it('is true when every package that this system needs is noted in the locked version', async () => {
    await write({ 'node_modules/a': { version: '1.2.3' } });
    expect(npmPackagesMatch(root)).toBe(true);
  });

  it.each([
    ['nothing is installed', undefined],
    ['a package is missing', {}],
    ['a package has another version', { 'node_modules/a': { version: '1.2.4' } }],
    [
      'an optional package has another version',
      {
        'node_modules/a': { version: '1.2.3' },
        'node_modules/for-another-system': { version: '0.9.0' },
      },
    ],
  ])('is false when %s', async (_what, noted) => {
    await write(noted);
    expect(npmPackagesMatch(root)).toBe(false);
  });
});
