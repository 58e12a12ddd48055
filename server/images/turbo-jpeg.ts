import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Pixels } from './pixels.ts';

/** What the package's WASM file exports (libjpeg-turbo 2.0, turbojpeg.h). */
interface Turbo {
  memory: WebAssembly.Memory;
  malloc(bytes: number): number;
  free(pointer: number): void;
  tjInitDecompress(): number;
  tjDestroy(handle: number): number;
  tjDecompressHeader3(
    handle: number,
    file: number,
    length: number,
    ...facts: [width: number, height: number, subsampling: number, colours: number]
  ): number;
  tjDecompress2(
    handle: number,
    file: number,
    length: number,
    ...into: [
      pixels: number,
      width: number,
      pitch: number,
      height: number,
      format: number,
      flags: number,
    ]
  ): number;
}

const RGBA = 7;

let compiled: WebAssembly.Module | undefined;
let held: Turbo | undefined;

const unreachable = (name: string) => () => {
  throw new Error(`libjpeg-turbo called ${name}`);
};

function turbo(): Turbo {
  compiled ??= new WebAssembly.Module(
    readFileSync(createRequire(import.meta.url).resolve('@cwasm/jpeg-turbo/jpeg-turbo.wasm')),
  );
  held ??= new WebAssembly.Instance(compiled, {
    // The library reports a fatal error by longjmp, which therefore must not return.
    env: { setjmp: () => 0, longjmp: unreachable('longjmp: the file cannot be decoded') },
    wasi_snapshot_preview1: {
      environ_sizes_get: () => 0,
      environ_get: unreachable('environ_get'),
      proc_exit: unreachable('proc_exit'),
      fd_close: unreachable('fd_close'),
      fd_seek: unreachable('fd_seek'),
      fd_write: unreachable('fd_write'),
    },
  }).exports as unknown as Turbo;
  return held;
}

/** Eighths that the decoder can scale by, of which the smallest that keeps `edge` px on the long side is taken. */
function eighthsFor(longest: number, edge: number): number {
  for (let eighths = 1; eighths < 8; eighths += 1) {
    if (Math.ceil((longest * eighths) / 8) >= edge) return eighths;
  }
  return 8;
}

/**
 * Decodes a JPEG no larger than needed: at the smallest n/8 whose long side is still at least `edge`
 * px, by the decoder's own scaled inverse transform. Pixels as stored, orientation not applied.
 * Data with errors in the middle is decoded as far as it goes, as browsers do. Throws on a file the
 * decoder gives up on (and on CMYK, which it does not turn into RGB).
 */
export function decodeJpeg(file: Uint8Array, edge: number): Pixels {
  try {
    return decodeWith(turbo(), file, edge);
  } catch (error) {
    // An instance that threw has lost its stack and heap.
    held = undefined;
    throw error;
  }
}

function decodeWith(lib: Turbo, file: Uint8Array, edge: number): Pixels {
  const input = lib.malloc(file.length);
  new Uint8Array(lib.memory.buffer, input, file.length).set(file);
  const handle = lib.tjInitDecompress();
  const facts = lib.malloc(16);
  const header = lib.tjDecompressHeader3(
    handle,
    input,
    file.length,
    facts,
    facts + 4,
    facts + 8,
    facts + 12,
  );
  const [fullWidth = 0, fullHeight = 0, , colours = 0] = new Int32Array(
    lib.memory.buffer,
    facts,
    4,
  );
  // Colour spaces 3 and 4 are CMYK and YCCK.
  if (header !== 0 || fullWidth === 0 || colours > 2)
    throw new Error('not a JPEG for this decoder');

  const eighths = eighthsFor(Math.max(fullWidth, fullHeight), edge);
  const width = Math.ceil((fullWidth * eighths) / 8);
  const height = Math.ceil((fullHeight * eighths) / 8);
  const length = width * height * 4;
  const output = lib.malloc(length);
  if (output === 0) throw new Error('no memory for the pixels');
  // Not zero also after a warning, when the pixels are there; a fatal error has thrown.
  lib.tjDecompress2(handle, input, file.length, output, width, width * 4, height, RGBA, 0);
  const data = Buffer.from(new Uint8Array(lib.memory.buffer, output, length));

  lib.tjDestroy(handle);
  for (const pointer of [input, facts, output]) lib.free(pointer);
  return { data, width, height };
}
