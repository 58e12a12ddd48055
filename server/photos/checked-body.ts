import { createHash } from 'node:crypto';
import { Unsupported } from '#domain/errors.ts';
import { isTypeOf, type PhotoType } from '#domain/photo-file.ts';
import { PhotoWalk } from '#server/images/walk-photo.ts';
import { ArrivedDamaged } from './arrived-damaged.ts';

/** How long a sender may be silent in the middle of a photo, in ms. */
const SENDER_SILENCE = 30_000;

/** What the sender says of the body. */
export interface SaidOfBody {
  /** SHA-256 in hex. */
  sha256: string;
  /** In bytes. */
  length: number;
  /** Media type; null when nothing definite is said. */
  mediaType: string | null;
}

type Source = AsyncIterator<Uint8Array, unknown>;

async function nextPiece(source: Source, silence: number): Promise<Uint8Array | undefined> {
  let timer: NodeJS.Timeout | undefined;
  const tooLong = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new Error('silent')), silence);
  });
  try {
    const step = await Promise.race([source.next(), tooLong]);
    return step.done ? undefined : step.value;
  } catch {
    // Silent or cut: either way the sender has to begin anew.
    throw new ArrivedDamaged('The photo stopped coming half-way. Send it again.');
  } finally {
    clearTimeout(timer);
  }
}

/**
 * A photo's bytes on their way to the store, looked at as they pass: kind, structure, pixels, length,
 * SHA-256, MD5. The last piece is held back until all of it is right, so that a store never gets a
 * whole file that is refused. No more than two pieces are in memory.
 */
export class CheckedBody {
  readonly walk = new PhotoWalk();
  readonly #source: Source;
  readonly #said: SaidOfBody;
  readonly #silence: number;
  readonly #sha256 = createHash('sha256');
  readonly #md5 = createHash('md5');
  #length = 0;
  #held: Uint8Array[] = [];
  #over = false;
  #md5Hex = '';

  constructor(source: AsyncIterable<Uint8Array>, said: SaidOfBody, silence = SENDER_SILENCE) {
    this.#source = source[Symbol.asyncIterator]();
    this.#said = said;
    this.#silence = silence;
  }

  /** MD5 in hex, once everything has passed. */
  get md5(): string {
    return this.#md5Hex;
  }

  /** Reads as far as needed to know the kind of photo. Throws a Problem for anything that is none. */
  async begin(): Promise<PhotoType> {
    while (this.walk.mediaType === undefined && !this.#over) await this.#read();
    const found = this.walk.mediaType;
    if (found === undefined) throw new Error('a photo without a kind passed');
    const { mediaType } = this.#said;
    if (mediaType !== null && !isTypeOf(mediaType, found)) {
      throw new Unsupported(
        `This file was sent as ${mediaType} and is ${found}. Send it as what it is.`,
      );
    }
    return found;
  }

  /** Everything from the first byte on. `mayEnd` is asked before the last piece is given out. */
  async *pieces(mayEnd: () => Promise<void>): AsyncGenerator<Uint8Array, void> {
    for (;;) {
      while (!this.#over && this.#held.length < 2) await this.#read();
      if (this.#over) break;
      yield* this.#held.splice(0, this.#held.length - 1);
    }
    await mayEnd();
    yield* this.#held.splice(0);
  }

  async #read(): Promise<void> {
    const piece = await nextPiece(this.#source, this.#silence);
    if (piece === undefined) {
      this.#finish();
      return;
    }
    this.#length += piece.length;
    if (this.#length > this.#said.length) throw new ArrivedDamaged();
    this.#sha256.update(piece);
    this.#md5.update(piece);
    this.walk.push(piece);
    this.#held.push(piece);
  }

  #finish(): void {
    if (this.#length !== this.#said.length) throw new ArrivedDamaged();
    const sha256 = this.#sha256.digest('hex');
    this.#md5Hex = this.#md5.digest('hex');
    // First whether it came as it was sent: a file that is cut on the way is not a broken photo.
    if (sha256 !== this.#said.sha256) throw new ArrivedDamaged();
    this.walk.end();
    this.#over = true;
  }
}
