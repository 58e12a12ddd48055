import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { createWriteStream } from 'node:fs';
import type { Report } from './stand-in.ts';

/** A program to run beside this one. */
export interface Program {
  /** What it is to a person, as the subject of a sentence: "The object store". */
  name: string;
  /** The module and its arguments. */
  module: string;
  args?: string[];
  env: Record<string, string | undefined>;
  /** Flags for Node itself. */
  nodeFlags?: string[];
  /** Where everything it prints goes; a file that is begun anew. */
  logFile: string;
}

/** A started program. */
export interface Child {
  name: string;
  process: ChildProcess;
  /** Its first report over IPC. */
  report: Promise<Report>;
  /** Resolves when it has ended, with how: an exit code or the name of a signal. */
  ended: Promise<number | string>;
  isOver: () => boolean;
  /** The last lines it wrote to standard error. */
  lastWords: () => string;
}

/**
 * Starts a TypeScript or JavaScript program in a session of its own, so that Ctrl-C in a terminal reaches only
 * the one that started it; when that one dies, however it dies, the kernel ends the program.
 */
export function startChild({
  name,
  module,
  args = [],
  env,
  nodeFlags = [],
  logFile,
}: Program): Child {
  const log = createWriteStream(logFile);
  const child = spawn(
    'setpriv',
    ['--pdeathsig=TERM', process.execPath, ...nodeFlags, '--import', 'tsx', module, ...args],
    { env, detached: true, stdio: ['ignore', 'pipe', 'pipe', 'ipc'] },
  );
  let words = '';
  child.stderr?.on('data', (chunk: Buffer) => (words = (words + String(chunk)).slice(-4000)));
  child.stderr?.pipe(log, { end: false });
  child.stdout?.pipe(log, { end: false });
  let over = false;
  const ended = new Promise<number | string>((resolve) => {
    child.once('error', (error) => {
      words += error.message;
      over = true;
      resolve(error.message);
    });
    child.once('close', (code, signal) => {
      over = true;
      log.end();
      resolve(code ?? signal ?? 'unknown');
    });
  });
  return {
    name,
    process: child,
    report: new Promise((resolve) =>
      child.once('message', (message) => resolve(message as Report)),
    ),
    ended,
    isOver: () => over,
    lastWords: () => words.trim(),
  };
}

/** Asks a program to stop, and ends it and all that it started when it has not within `cap` milliseconds. */
export async function stopChild(child: Child, cap: number): Promise<void> {
  if (child.isOver()) return;
  child.process.kill('SIGTERM');
  const timer = setTimeout(() => killGroup(child), cap);
  await child.ended;
  clearTimeout(timer);
}

/** Ends a program and all that it started at once. */
export function killGroup({ process: { pid } }: Child): void {
  try {
    if (pid !== undefined) process.kill(-pid, 'SIGKILL');
  } catch {
    // It has just ended by itself.
  }
}
