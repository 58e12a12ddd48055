import { execFile } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync } from 'node:fs';
import { mkdir, rename, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { basename, dirname, join } from 'node:path';
import { promisify } from 'node:util';
import { Failure, sentenceForFullDisk } from '../scripts/sentences.mjs';

// sun_path of a Unix socket address, without the closing zero byte (unix(7)).
const longestSocketPath = 107;
const socketFolder = 'witnessmark-socket-';

/** `mariadbd` refuses to run as root unless told so in these words. */
export const asUser = process.getuid?.() === 0 ? ['--user=root'] : [];

/** Where the server writes its process id. */
export const pidFile = (directory: string) => join(directory, 'mariadbd.pid');

/** A path for the server's socket: in the data folder, or under the temporary folder when that path is too long. */
export function socketPath(directory: string): string {
  const path = join(directory, 'mysqld.sock');
  if (Buffer.byteLength(path) <= longestSocketPath) return path;
  return join(mkdtempSync(join(tmpdir(), socketFolder)), 'mysqld.sock');
}

/** Removes the folder that `socketPath` made for a socket, if it made one. */
export async function removeSocketFolder(socket: string): Promise<void> {
  if (dirname(dirname(socket)) === tmpdir() && basename(dirname(socket)).startsWith(socketFolder))
    await rm(dirname(socket), { recursive: true, force: true });
}

/**
 * The process id of a server that runs on this data folder, or undefined. The file alone proves nothing: it
 * outlives a killed server, and its number may belong to another program by now.
 */
export function runningServer(directory: string): number | undefined {
  try {
    const pid = Number(readFileSync(pidFile(directory), 'utf8'));
    const words = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
    return words.includes(`--datadir=${directory}`) ? pid : undefined;
  } catch {
    return undefined;
  }
}

/**
 * Makes the data folder with its system tables unless it is there. It is made beside its place and moved, so
 * that a killed installation leaves no half-made folder that would be taken for a whole one.
 */
export async function installFolder(directory: string): Promise<void> {
  if (existsSync(join(directory, 'mysql'))) return;
  const making = `${directory}.making`;
  await rm(making, { recursive: true, force: true });
  await mkdir(dirname(directory), { recursive: true });
  await mkdir(making, { mode: 0o700 });
  await promisify(execFile)('mariadb-install-db', [
    '--no-defaults',
    ...asUser,
    `--datadir=${making}`,
    '--auth-root-authentication-method=normal',
    '--skip-test-db',
  ]).catch((error: NodeJS.ErrnoException & { stdout?: string; stderr?: string }) => {
    const said = `${error.stdout ?? ''}${error.stderr ?? ''}${error.message}`;
    throw new Failure(
      error.code === 'ENOENT'
        ? 'MariaDB is not installed. Run: apt-get install -y mariadb-server-core mariadb-client-core'
        : (sentenceForFullDisk(said) ??
            `MariaDB could not make its data folder: ${said.trim().split('\n').at(-1)}`),
    );
  });
  await rm(directory, { recursive: true, force: true });
  await rename(making, directory);
}
