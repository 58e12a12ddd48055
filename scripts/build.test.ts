import { mkdir, mkdtemp, rm, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { buildIsFresh, sourcesDigest } from './build.mjs';

let root = '';
const write = (path: string, text: string) => writeFile(join(root, path), text);

beforeEach(async () => {
  root = await mkdtemp(join(tmpdir(), 'witnessmark-build-'));
  for (const folder of ['app/routes', 'server', 'build', 'local'])
    await mkdir(join(root, folder), { recursive: true });
  await write('app/routes/home.tsx', 'one');
  await write('build/sources.sha256', sourcesDigest(root));
});

afterEach(() => rm(root, { recursive: true }));

it('takes a build for fresh until a source changes, is added or removed', async () => {
  expect(buildIsFresh(root)).toBe(true);
  await write('app/routes/home.tsx', 'two');
  expect(buildIsFresh(root)).toBe(false);
  await write('app/routes/home.tsx', 'one');
  await write('vite.config.ts', 'x');
  expect(buildIsFresh(root)).toBe(false);
  await rm(join(root, 'vite.config.ts'));
  await rm(join(root, 'app/routes/home.tsx'));
  expect(buildIsFresh(root)).toBe(false);
});

it('tells a renamed file from the old one', async () => {
  await rm(join(root, 'app/routes/home.tsx'));
  await write('app/routes/rack.tsx', 'one');
  expect(buildIsFresh(root)).toBe(false);
});

it('does not mind tests, other folders or the time of a file', async () => {
  await write('server/env.test.ts', 'x');
  await write('local/run.ts', 'x');
  await utimes(join(root, 'app/routes/home.tsx'), 0, 0);
  expect(buildIsFresh(root)).toBe(true);
});

it('needs a build where there is none', async () => {
  await rm(join(root, 'build'), { recursive: true });
  expect(buildIsFresh(root)).toBe(false);
});
