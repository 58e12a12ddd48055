import { Problem } from '#domain/errors.ts';
import type { DerivedPicture } from './derive-picture.ts';
import {
  type Failure,
  type PictureLimits,
  PictureProcess,
  type Question,
} from './picture-process.ts';

const SENTENCES: Record<Failure, string> = {
  undecodable:
    'This photo cannot be shown: the picture in it cannot be read. Take it off and add it again.',
  memory:
    'This photo cannot be shown: it needs too much memory. Take it off and add a smaller one.',
  time: 'This photo cannot be shown: it takes too long to read. Take it off and add it again.',
  crash: 'This photo cannot be shown: reading it fails. Take it off and add it again.',
};

/** A photo of which no copies can be made, whoever tries. */
export class CannotDerive extends Problem {
  constructor(failure: Failure) {
    super(`picture-${failure}`, SENTENCES[failure]);
  }
}

/** A process that has grown beyond this many bytes is replaced before the next picture. */
const REPLACE_ABOVE = 500_000_000;
const IDLE_MS = 20_000;

/** The largest PNG the shop takes was seen to need 1.5 GB, and 20 s of one core. */
const LIMITS: PictureLimits = { memory: 2_000_000_000, time: 90_000 };

/** Picture processes: at most `size` at once, started when needed, ended when idle. */
export class PicturePool {
  readonly #size: number;
  readonly #limits: PictureLimits;
  readonly #waiting: (() => void)[] = [];
  #busy = 0;
  #idle: PictureProcess[] = [];
  #timer: NodeJS.Timeout | undefined;

  constructor(size: number, limits = LIMITS) {
    this.#size = size;
    this.#limits = limits;
  }

  /** Makes everything of one picture. Throws CannotDerive. */
  async derive(question: Question): Promise<DerivedPicture> {
    if (this.#busy < this.#size) this.#busy += 1;
    else await new Promise<void>((go) => this.#waiting.push(go));
    clearTimeout(this.#timer);
    try {
      let result = await this.#try(question);
      // Something else may have ended the process; a picture that ends two is to blame itself.
      if (result === 'crash') result = await this.#try(question);
      if (typeof result === 'string') throw new CannotDerive(result);
      return result;
    } finally {
      // The place goes to the next in line, or becomes free.
      const next = this.#waiting.shift();
      if (next === undefined) this.#busy -= 1;
      else next();
      this.#timer = setTimeout(() => this.end(), IDLE_MS).unref();
    }
  }

  /** Ends the idle processes. */
  end(): void {
    for (const process of this.#idle.splice(0)) process.end();
  }

  async #try(question: Question): Promise<DerivedPicture | Failure> {
    const process = this.#idle.pop() ?? new PictureProcess();
    const result = await process.derive(question, this.#limits);
    if (typeof result === 'string' || process.memory > REPLACE_ABOVE) process.end();
    else this.#idle.push(process);
    return result;
  }
}

/** The process's pool: two pictures at once, as many as a small machine has cores. */
export const picturePool = new PicturePool(2);
