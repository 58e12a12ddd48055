import { createRequire } from 'node:module';
import type { Pixels } from './pixels.ts';

/** The parts of libheif-js used here; its own types do not cover them. */
interface HeifImage {
  get_width(): number;
  get_height(): number;
  is_primary(): number;
  display(into: Target, done: (result: Target | null) => void): void;
  free(): void;
}
type Target = { data: Uint8ClampedArray; width: number; height: number };
type Heif = { HeifDecoder: new () => { decode(file: Uint8Array): HeifImage[] } };

let held: Heif | undefined;

/** Decodes the primary picture of a HEIC file by libheif, which also turns it upright. Throws when it cannot. */
export async function decodeHeic(file: Uint8Array): Promise<Pixels> {
  held ??= createRequire(import.meta.url)('libheif-js/wasm-bundle') as Heif;
  const images = new held.HeifDecoder().decode(file);
  const primary = images.find((image) => image.is_primary()) ?? images[0];
  if (primary === undefined) throw new Error('libheif found no picture');
  const width = primary.get_width();
  const height = primary.get_height();
  const data = Buffer.alloc(width * height * 4);
  const target = { data: new Uint8ClampedArray(data.buffer), width, height };
  const done = await new Promise<Target | null>((resolve) => primary.display(target, resolve));
  for (const image of images) image.free();
  if (done === null) throw new Error('libheif could not decode the picture');
  return { data, width, height };
}
