import { Invalid } from '#domain/errors.ts';

/** The file ends before its own structure says so. */
export const truncated = () =>
  new Invalid({
    photo: 'This photo stops before its end. Copy it again from the camera, or take it again.',
  });

/** The file's structure contradicts itself. */
export const damaged = () =>
  new Invalid({
    photo: 'This photo is damaged inside. Copy it again from the camera, or take it again.',
  });

/**
 * What a walk asks for next: `take` that many bytes together (with `orEnd`: or none, at the very
 * end), `pass` over that many (with `orEnd`: or what there is) while `see` looks at the pieces, or
 * skip up to and over the next byte 0xff.
 */
export type Want =
  | { take: number; orEnd?: true }
  | { pass: number; orEnd?: true; see?: (piece: Uint8Array) => void }
  | 'to next ff';

/** A walk through a file's structure, written as if the whole file were there. Returns at the picture's end. */
export type Walk = Generator<Want, void, Uint8Array>;

const NOTHING = new Uint8Array();

/** Feeds a walk with a file in pieces of any size, keeping no more than the bytes it asked for together. */
export class Feed {
  readonly #walk: Walk;
  #want: Want | undefined;
  #held: Uint8Array[] = [];
  #heldLength = 0;
  #passed = 0;

  constructor(walk: Walk) {
    this.#walk = walk;
    this.#resume(walk.next());
  }

  /** Goes on with the next piece. Throws what the walk throws. */
  push(piece: Uint8Array): void {
    let rest = piece;
    while (this.#want !== undefined && rest.length > 0) rest = this.#give(this.#want, rest);
  }

  /** The file is over. Throws `truncated` when the walk is not. */
  end(): void {
    const want = this.#want;
    if (want === undefined) return;
    const mayEnd = want !== 'to next ff' && want.orEnd === true;
    if (!mayEnd || this.#heldLength > 0) throw truncated();
    this.#resume(this.#walk.next(NOTHING));
  }

  #resume(step: IteratorResult<Want, void>): void {
    this.#want = step.done ? undefined : step.value;
    this.#held = [];
    this.#heldLength = 0;
    this.#passed = 0;
  }

  #give(want: Want, piece: Uint8Array): Uint8Array {
    if (want === 'to next ff') {
      const at = piece.indexOf(0xff);
      if (at < 0) return NOTHING;
      this.#resume(this.#walk.next(NOTHING));
      return piece.subarray(at + 1);
    }
    if ('pass' in want) {
      const part = piece.subarray(0, want.pass - this.#passed);
      want.see?.(part);
      this.#passed += part.length;
      if (this.#passed === want.pass) this.#resume(this.#walk.next(NOTHING));
      return piece.subarray(part.length);
    }
    const part = piece.subarray(0, want.take - this.#heldLength);
    this.#held.push(part);
    this.#heldLength += part.length;
    if (this.#heldLength === want.take) this.#resume(this.#walk.next(joined(this.#held)));
    return piece.subarray(part.length);
  }
}

function joined(pieces: Uint8Array[]): Uint8Array {
  const [first = NOTHING] = pieces;
  if (pieces.length === 1) return first;
  const all = new Uint8Array(pieces.reduce((sum, { length }) => sum + length, 0));
  let at = 0;
  for (const piece of pieces) {
    all.set(piece, at);
    at += piece.length;
  }
  return all;
}
