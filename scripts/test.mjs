/**
 * `npm test`: installs what is missing, then checks types, style and build, and runs every test. `--soak` runs the
 * long ones instead. The last line is `N passed, N failed`; the exit code says the same.
 * Only Node's own modules here, because nothing else may be installed yet.
 */
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from './build.mjs';
import { countReport } from './count.mjs';
import {
  debianPackages,
  installDebianPackages,
  installNpmPackages,
  requireNode,
} from './machine.mjs';
import { sentenceFor } from './sentences.mjs';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const say = (/** @type {string} */ line) => console.log(line);
const total = { passed: 0, failed: 0 };
/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();
const began = Date.now();

process.on('SIGTERM', () => {
  for (const child of running) child.kill('SIGTERM');
  process.exit(1);
});
process.chdir(root);
const reports = mkdtempSync(join(tmpdir(), 'witnessmark-reports-'));
try {
  requireNode(process.version);
  await installDebianPackages({ ...debianPackages.start, ...debianPackages.test }, say);
  await installNpmPackages(root, say);
  if (process.argv.includes('--soak')) {
    await check('build', () => build(root, say));
    await tests('soak');
  } else {
    // Two checks of one thread each, side by side on two cores.
    await Promise.all([
      check('types', types),
      check('lint', () => program('node_modules/eslint/bin/eslint.js', ['.'])),
    ]);
    await check('build', () => build(root, say));
    await tests('pure', 'machine', 'services');
    await tests('journeys');
  }
} catch (error) {
  console.error(sentenceFor(error));
  total.failed += 1;
} finally {
  rmSync(reports, { recursive: true, force: true });
}
say(`\nThe whole run took ${Math.round((Date.now() - began) / 1000)} s.`);
// With nothing passed something is wrong with the run itself.
process.exitCode = total.failed > 0 || total.passed === 0 ? 1 : 0;
say(`${total.passed} passed, ${total.failed} failed`);

async function types() {
  await program('node_modules/@react-router/dev/bin.js', ['typegen']);
  await program('node_modules/typescript/bin/tsc', ['-p', '.']);
}

/**
 * Counts one check that either holds or not.
 * @param {string} name
 * @param {() => Promise<void>} work
 */
async function check(name, work) {
  const start = Date.now();
  try {
    await work();
    total.passed += 1;
    say(`${name}: right (${Math.round((Date.now() - start) / 1000)} s)`);
  } catch (error) {
    total.failed += 1;
    say(`${name}: not right. ${sentenceFor(error)}`);
  }
}

/**
 * Runs the tests of these vitest projects and adds what its report counts.
 * @param {...string} projects
 */
async function tests(...projects) {
  const report = join(reports, `${projects.join('-')}.json`);
  const ended = await program('node_modules/vitest/vitest.mjs', [
    'run',
    ...projects.flatMap((project) => ['--project', project]),
    '--reporter=default',
    '--reporter=json',
    `--outputFile.json=${report}`,
  ]).then(
    () => true,
    () => false,
  );
  const { passed, failed } = countReport(report, ended);
  total.passed += passed;
  total.failed += failed;
}

/**
 * Runs one of the installed tools with its output shown.
 * @param {string} path
 * @param {string[]} args
 * @returns {Promise<void>}
 */
function program(path, args) {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [path, ...args], { cwd: root, stdio: 'inherit' });
    running.add(child);
    child.on('error', reject);
    child.on('exit', (code, signal) => {
      running.delete(child);
      if (code === 0) resolve();
      else reject(new Error(`It ended with ${code ?? signal}.`));
    });
  });
}
