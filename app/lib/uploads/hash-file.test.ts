import { createHash, randomBytes } from 'node:crypto';
import { afterEach, expect, it, vi } from 'vitest';
import { hashFile } from './hash-file.ts';

afterEach(() => vi.unstubAllGlobals());

const bytes = randomBytes(300_001);
const expected = createHash('sha256').update(bytes).digest('hex');
// FIPS 180-4, example for "abc".
const ABC = 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad';

it('is SHA-256 by the browser’s own means', async () => {
  expect(await hashFile(new Blob(['abc']))).toBe(ABC);
  expect(await hashFile(new Blob([bytes]))).toBe(expected);
});

it('is the same where the browser has none', async () => {
  vi.stubGlobal('crypto', {});
  expect(await hashFile(new Blob(['abc']))).toBe(ABC);
  expect(await hashFile(new Blob([bytes]))).toBe(expected);
});
