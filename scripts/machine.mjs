/**
 * What a bare machine lacks and how it gets there: Debian packages and the npm packages of the lock file.
 * Only Node's own modules here, because it runs before anything is installed.
 */
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readFileSync, statfsSync } from 'node:fs';
import { join } from 'node:path';
import { Failure, diskFullSentence, sentenceForOutput } from './sentences.mjs';

/** Debian packages by a file that each one brings. The `-core` packages hold the server without its system service. */
export const debianPackages = {
  start: {
    'mariadb-server-core': '/usr/sbin/mariadbd',
    'mariadb-client-core': '/usr/bin/my_print_defaults',
    openssl: '/usr/bin/openssl',
  },
  test: {
    chromium: '/usr/bin/chromium',
    'poppler-utils': '/usr/bin/pdfsig',
    'zbar-tools': '/usr/bin/zbarimg',
    'libimage-exiftool-perl': '/usr/bin/exiftool',
    qpdf: '/usr/bin/qpdf',
    'golang-go': '/usr/bin/go',
    'golang-golang-x-mod-dev': '/usr/share/gocode/src/golang.org/x/mod/sumdb/note/note.go',
  },
};

/**
 * @param {string} version such as `v20.20.2`
 * @throws {Failure} when this Node is older than the program can run on
 */
export function requireNode(version) {
  if (Number(/^v(\d+)/.exec(version)?.[1]) >= 20) return;
  throw new Failure(
    `Node.js 20 or newer is needed; this is ${version}. Install a newer one, then run the same command again.`,
  );
}

/**
 * @param {string} folder a folder on the disk to look at
 * @param {number} bytes how much must be free
 * @throws {Failure} when less is free
 */
export function requireSpace(folder, bytes) {
  const { bavail, bsize } = statfsSync(folder);
  if (bavail * bsize < bytes) throw new Failure(diskFullSentence());
}

/**
 * Names of the packages whose file is missing.
 * @param {Record<string, string>} packages package name to a file it brings
 * @param {(path: string) => boolean} [exists]
 * @returns {string[]}
 */
export function missingPackages(packages, exists = existsSync) {
  return Object.keys(packages).filter((name) => !exists(packages[name]));
}

/**
 * The words before `apt-get` that give it the right to install, or the sentence when there is no right.
 * @param {string[]} missing
 * @param {{ uid: number, sudo: boolean }} who sudo: whether sudo would work, without or with a question
 * @returns {string[]}
 */
export function aptPrefix(missing, { uid, sudo }) {
  if (uid === 0) return [];
  if (sudo) return ['sudo'];
  throw new Failure(
    `Debian packages are missing and this user may not install them. As root, run: apt-get install -y ${missing.join(' ')}`,
  );
}

function sudoWorks() {
  if (spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0) return true;
  return process.stdin.isTTY === true && existsSync('/usr/bin/sudo');
}

/**
 * Installs the missing ones of these Debian packages.
 * @param {Record<string, string>} packages
 * @param {(line: string) => void} say told once before each slow step
 */
export async function installDebianPackages(packages, say) {
  const missing = missingPackages(packages);
  if (missing.length === 0) return;
  if (!existsSync('/usr/bin/apt-get'))
    throw new Failure(
      `These programs are missing and there is no apt-get here to install them: ${missing.join(' ')}. Install them by hand, then run the same command again.`,
    );
  const prefix = aptPrefix(missing, { uid: process.getuid?.() ?? -1, sudo: sudoWorks() });
  const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' };
  const apt = (/** @type {string[]} */ ...words) =>
    run([...prefix, 'apt-get', '-q', '-o', 'Acquire::Retries=2', ...words], environment);
  say(`Installing Debian packages: ${missing.join(' ')}`);
  // A list that cannot be fetched need not matter; whether the packages can is seen next.
  const update = await apt('update');
  const install = await apt('install', '-y', '--no-install-recommends', ...missing);
  if (install.status !== 0)
    throw failure('apt-get install', install, `Debian’s packages`, update.output);
}

/**
 * Whether what npm noted in node_modules is what the lock file asks for.
 * @param {string} root
 * @returns {boolean}
 */
export function npmPackagesMatch(root) {
  const noted = join(root, 'node_modules/.package-lock.json');
  if (!existsSync(noted)) return false;
  const wanted = JSON.parse(readFileSync(join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(noted, 'utf8')).packages;
  return Object.keys(wanted).every(
    (path) =>
      path === '' ||
      present[path]?.version === wanted[path].version ||
      (present[path] === undefined && (wanted[path].optional || wanted[path].peer)),
  );
}

/**
 * Installs the npm packages of the lock file unless they are there.
 * @param {string} root
 * @param {(line: string) => void} say
 */
export async function installNpmPackages(root, say) {
  if (npmPackagesMatch(root)) return;
  say('Installing npm packages (about a minute)');
  const install = await run(['npm', 'ci', '--no-progress'], process.env, root);
  if (install.status !== 0) throw failure('npm ci', install, 'The npm packages');
}

/**
 * @param {string} command what was run
 * @param {{ status: number | null, output: string }} ended
 * @param {string} what what it was to fetch, as the subject of a sentence
 * @param {string} [before] what an earlier step printed that may be the reason
 */
function failure(command, { status, output }, what, before = '') {
  if (status === null) return new Failure('Stopped.');
  const lastLines = output.trim().split('\n').slice(-15).join('\n');
  const sentence = sentenceForOutput(before + output, what);
  return new Failure(sentence ?? `${command} failed. It said:\n${lastLines}`);
}

/**
 * Runs a program to its end; a signal to this process reaches it too.
 * @param {string[]} words
 * @param {NodeJS.ProcessEnv} env
 * @param {string} [cwd]
 * @returns {Promise<{ status: number | null, output: string }>} status is null when a signal ended it
 */
function run(words, env, cwd) {
  const [program = '', ...rest] = words;
  return new Promise((resolve, reject) => {
    const child = spawn(program, rest, { env, cwd, stdio: ['inherit', 'pipe', 'pipe'] });
    let output = '';
    const keep = (/** @type {Buffer} */ chunk) => (output = (output + chunk).slice(-100_000));
    child.stdout.on('data', keep);
    child.stderr.on('data', keep);
    const stop = () => child.kill('SIGTERM');
    process.once('SIGTERM', stop);
    // Ctrl-C reaches it by itself; this process only has to outlive it.
    process.once('SIGINT', stop);
    child.on('error', reject);
    child.on('close', (status) => {
      process.off('SIGTERM', stop);
      process.off('SIGINT', stop);
      resolve({ status, output });
    });
  });
}
