import type { Pixels } from './pixels.ts';

/**
 * How the upright picture is read out of the stored one, `w` by `h` px: the index of its first
 * pixel, and the steps to the next pixel of a row and to the next row.
 */
type Reading = [first: number, nextInRow: number, nextRow: number];

// Exif 2.32 tag 0x0112, values 2 to 8.
const READINGS: Record<number, (w: number, h: number) => Reading> = {
  2: (w) => [w - 1, -1, w],
  3: (w, h) => [w * h - 1, -1, -w],
  4: (w, h) => [w * (h - 1), 1, -w],
  5: (w) => [0, w, 1],
  6: (w, h) => [w * (h - 1), -w, 1],
  7: (w, h) => [w * h - 1, -w, -1],
  8: (w) => [w - 1, w, -1],
};

/** Whether an Exif orientation swaps width and height. */
export const swapsSides = (orientation: number) => orientation >= 5 && orientation <= 8;

/** The picture as it is to be seen, by its Exif orientation (1 to 8); any other value leaves it as it is. */
export function turnUpright(stored: Pixels, orientation: number): Pixels {
  const { width: w, height: h } = stored;
  const reading = READINGS[orientation]?.(w, h);
  if (reading === undefined) return stored;
  const [first, nextInRow, nextRow] = reading;
  const [width, height] = swapsSides(orientation) ? [h, w] : [w, h];
  const from = new Uint32Array(stored.data.buffer, stored.data.byteOffset, w * h);
  const to = new Uint32Array(w * h);
  for (let y = 0, at = 0; y < height; y += 1) {
    let source = first + y * nextRow;
    for (const end = at + width; at < end; at += 1, source += nextInRow) to[at] = from[source] ?? 0;
  }
  return { data: Buffer.from(to.buffer), width, height };
}
