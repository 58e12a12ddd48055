/**
 * Builds the web bundle when its sources have changed since the last build.
 * Only Node's own modules here; the build itself runs as a program of its own.
 */
import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Failure, sentenceForOutput } from './sentences.mjs';

const sources = ['app', 'domain', 'evidence', 'server', 'public'];
const settings = [
  'package-lock.json',
  'scripts/precompress.ts',
  'react-router.config.ts',
  'vite.config.ts',
  'tsconfig.json',
];
const mark = 'build/sources.sha256';

/**
 * One value for all that the bundle is made from; tests are left out.
 * @param {string} root
 * @returns {string} SHA-256, hex
 */
export function sourcesDigest(root) {
  const files = sources
    .filter((folder) => existsSync(join(root, folder)))
    .flatMap((folder) =>
      readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
        .filter((entry) => entry.isFile() && !/\.test\.tsx?$/.test(entry.name))
        .map((entry) => join(entry.parentPath, entry.name)),
    )
    .concat(settings.map((name) => join(root, name)).filter((path) => existsSync(path)))
    .sort();
  const digest = createHash('sha256');
  for (const path of files) {
    const bytes = readFileSync(path);
    digest.update(`${path.slice(root.length)}\0${bytes.length}\0`).update(bytes);
  }
  return digest.digest('hex');
}

/**
 * Whether the bundle is there and was made from the sources as they are now.
 * @param {string} root
 * @returns {boolean}
 */
export function buildIsFresh(root) {
  const path = join(root, mark);
  return existsSync(path) && readFileSync(path, 'utf8') === sourcesDigest(root);
}

/**
 * Builds when needed.
 * @param {string} root
 * @param {(line: string) => void} say told once before a build
 * @throws {Failure} with what the build printed when it fails
 */
export async function build(root, say) {
  if (buildIsFresh(root)) return;
  say('Building the pages');
  const digest = sourcesDigest(root);
  const { status, output } = await runBuild(root);
  if (status !== 0)
    throw new Failure(
      sentenceForOutput(output, 'The pages') ?? `The pages could not be built:\n${output.trim()}`,
    );
  writeFileSync(join(root, mark), digest);
}

/**
 * @param {string} root
 * @returns {Promise<{ status: number | null, output: string }>}
 */
function runBuild(root) {
  return new Promise((resolve, reject) => {
    const child = spawn(
      process.execPath,
      [join(root, 'node_modules/@react-router/dev/bin.js'), 'build'],
      {
        cwd: root,
        env: { ...process.env, NODE_ENV: 'production' },
        stdio: ['ignore', 'pipe', 'pipe'],
        detached: true,
      },
    );
    let output = '';
    const keep = (/** @type {Buffer} */ chunk) => (output += chunk);
    child.stdout.on('data', keep);
    child.stderr.on('data', keep);
    const stop = () => child.kill('SIGTERM');
    process.once('SIGTERM', stop);
    process.once('SIGINT', stop);
    child.on('error', reject);
    child.on('close', (status) => {
      process.off('SIGTERM', stop);
      process.off('SIGINT', stop);
      resolve({ status, output });
    });
  });
}
