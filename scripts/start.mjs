/**
 * `npm start`: installs what is missing, then hands over to local/run.ts.
 * Only Node's own modules here, because nothing else may be installed yet.
 */
import { spawn } from 'node:child_process';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import {
  debianPackages,
  installDebianPackages,
  installNpmPackages,
  npmPackagesMatch,
  requireNode,
  requireSpace,
} from './machine.mjs';
import { sentenceFor } from './sentences.mjs';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const say = (/** @type {string} */ line) => console.log(line);

// node_modules takes 660 MB, a new database 130 MB, photos and build the rest.
const spaceToInstall = 1_200_000_000;
const spaceToRun = 200_000_000;

try {
  process.chdir(root);
  requireNode(process.version);
  requireSpace(root, npmPackagesMatch(root) ? spaceToRun : spaceToInstall);
  await installDebianPackages(debianPackages.start, say);
  await installNpmPackages(root, say);
  run();
} catch (error) {
  console.error(sentenceFor(error));
  process.exitCode = 1;
}

/** Runs the rest in a session of its own and passes every signal on, so that it stops in its own order. */
function run() {
  const child = spawn(
    'setpriv',
    ['--pdeathsig=TERM', process.execPath, '--import', 'tsx', 'local/run.ts'],
    { cwd: root, detached: true, stdio: ['ignore', 'inherit', 'inherit'] },
  );
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
    process.on(signal, () => child.kill(signal));
  child.on('exit', (code) => process.exit(code ?? 1));
}
