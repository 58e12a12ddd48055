import { type ChildProcess, fork } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { PhotoType } from '#domain/photo-file.ts';
import type { DerivedPicture } from './derive-picture.ts';

/** What the process is asked, and what it answers: null when the file cannot be decoded. */
export interface Question {
  file: Uint8Array;
  type: PhotoType;
}
export interface Answer {
  derived: DerivedPicture | null;
}

/** What one picture may use: resident memory in bytes, time of the processor in ms. */
export interface PictureLimits {
  memory: number;
  time: number;
}

/** Why there is no picture: the file, its appetite, or the process itself. */
export type Failure = 'undecodable' | 'memory' | 'time' | 'crash';

const LOOK_EVERY_MS = 100;

const tsx = pathToFileURL(createRequire(import.meta.url).resolve('tsx')).href;
const program = fileURLToPath(new URL('./derive-worker.ts', import.meta.url));

const TICKS_PER_MS = 100 / 1000;
const PAGE = 4096;

const numbersIn = (file: string) => readFileSync(file, 'utf8').split(' ').map(Number);

/** What a process has used: resident memory in bytes, processor time in ms (proc(5)); nothing once it is gone. */
function usageOf(pid: number | undefined): PictureLimits {
  try {
    const [, pages = 0] = numbersIn(`/proc/${pid}/statm`);
    const stat = numbersIn(`/proc/${pid}/stat`);
    return { memory: pages * PAGE, time: ((stat[13] ?? 0) + (stat[14] ?? 0)) / TICKS_PER_MS };
  } catch {
    return { memory: 0, time: 0 };
  }
}

/** A child process that decodes pictures, so that a file that harms a decoder harms nothing else. */
export class PictureProcess {
  readonly #child: ChildProcess;

  constructor() {
    this.#child = fork(program, [], {
      execArgv: ['--import', tsx, '--max-old-space-size=512'],
      serialization: 'advanced',
      stdio: ['ignore', 'ignore', 'ignore', 'ipc'],
      // None of the server's secrets.
      env: { PATH: process.env.PATH, TMPDIR: process.env.TMPDIR },
    });
    this.#child.on('error', () => undefined);
    // An idle process does not keep its parent alive; it ends with it.
    this.#child.unref();
    this.#child.channel?.unref();
  }

  /** Memory it holds now, in bytes: decoders do not give theirs back. */
  get memory(): number {
    return usageOf(this.#child.pid).memory;
  }

  /** Ends it. */
  end(): void {
    this.#child.kill('SIGKILL');
  }

  /** Makes everything of one picture; on any failure the process may be gone and is not to be used again. */
  derive(question: Question, limits: PictureLimits): Promise<DerivedPicture | Failure> {
    return new Promise((resolve) => {
      const before = usageOf(this.#child.pid);
      const settle = (result: DerivedPicture | Failure) => {
        clearInterval(watch);
        this.#child.removeAllListeners('message').removeAllListeners('exit');
        resolve(result);
      };
      const watch = setInterval(() => {
        const { memory, time } = usageOf(this.#child.pid);
        if (memory > limits.memory) settle('memory');
        else if (time - before.time > limits.time) settle('time');
      }, LOOK_EVERY_MS);
      this.#child.once('exit', () => settle('crash'));
      this.#child.once('message', ({ derived }: Answer) => settle(derived ?? 'undecodable'));
      if (!this.#child.connected) settle('crash');
      else this.#child.send(question, (error) => error !== null && settle('crash'));
    });
  }
}
