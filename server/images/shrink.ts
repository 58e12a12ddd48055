import './image-data.ts';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import resize, { initResize } from '@jsquash/resize';
import type { Pixels } from './pixels.ts';

let ready: Promise<unknown> | undefined;

function load(): Promise<unknown> {
  const file = createRequire(import.meta.url).resolve(
    '@jsquash/resize/lib/resize/pkg/squoosh_resize_bg.wasm',
  );
  return initResize(new WebAssembly.Module(readFileSync(file)));
}

/** Width and height with the long side at most `edge` px, at least 1 px each; never larger than they are. */
export function sizeWithin(
  { width, height }: { width: number; height: number },
  edge: number,
): { width: number; height: number } {
  const scale = Math.min(1, edge / Math.max(width, height));
  const scaled = (side: number) => Math.max(1, Math.round(side * scale));
  return { width: scaled(width), height: scaled(height) };
}

/** Whether every pixel is opaque. */
export function isOpaque({ data }: Pixels): boolean {
  for (let at = 3; at < data.length; at += 4) if (data[at] !== 255) return false;
  return true;
}

/** The picture with a long side of at most `edge` px, by a Lanczos filter of three lobes. */
export async function shrink(picture: Pixels, edge: number, opaque: boolean): Promise<Pixels> {
  const size = sizeWithin(picture, edge);
  if (size.width === picture.width && size.height === picture.height) return picture;
  await (ready ??= load());
  // The resizer reads the whole ArrayBuffer behind a view, whatever the view shows.
  const { buffer, byteLength } = picture.data;
  const isWhole = buffer instanceof ArrayBuffer && buffer.byteLength === byteLength;
  const whole = isWhole ? new Uint8ClampedArray(buffer) : new Uint8ClampedArray(picture.data);
  const { data } = await resize(new ImageData(whole, picture.width, picture.height), {
    ...size,
    method: 'lanczos3',
    // Both cost a second pass over the pixels. Seams of transparent pictures need the first; the
    // second hardly shows in a photo.
    premultiply: !opaque,
    linearRGB: false,
  });
  return { data: Buffer.from(data.buffer), ...size };
}
