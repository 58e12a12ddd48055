import { Jimp } from 'jimp';
import { rgbaToThumbHash } from 'thumbhash';
import { expect, it } from 'vitest';
import { placeholderUrl } from './placeholder.ts';

const toBase64 = (bytes: Uint8Array) => btoa(String.fromCharCode(...bytes));

function hashOf(width: number, height: number, colour: (x: number) => [number, number, number]) {
  const rgba = new Uint8Array(width * height * 4);
  for (let y = 0; y < height; y += 1)
    for (let x = 0; x < width; x += 1) rgba.set([...colour(x), 255], (y * width + x) * 4);
  return toBase64(rgbaToThumbHash(width, height, rgba));
}

// Jimp's decoder (pngjs) is the outside reader: it checks CRC-32 and Adler-32.
it('is a PNG that another decoder reads, with the picture’s colours', async () => {
  const url = placeholderUrl(hashOf(80, 60, (x) => (x < 40 ? [180, 120, 60] : [40, 60, 50])));
  const image = await Jimp.fromBuffer(Buffer.from(url.split(',')[1] ?? '', 'base64'));
  expect([image.width, image.height]).toEqual([7, 5]);
  const left = image.getPixelColor(0, 2) >>> 0;
  const right = image.getPixelColor(6, 2) >>> 0;
  expect((left >>> 24) & 255).toBeGreaterThan(150);
  expect((right >>> 24) & 255).toBeLessThan(80);
});

it('stands upright when the picture does', async () => {
  const url = placeholderUrl(hashOf(60, 80, () => [90, 90, 90]));
  const image = await Jimp.fromBuffer(Buffer.from(url.split(',')[1] ?? '', 'base64'));
  expect(image.height).toBe(7);
  expect(image.width).toBeLessThan(7);
});

it('stays small enough to stand sixty times in a page', () => {
  expect(placeholderUrl(hashOf(80, 60, () => [1, 2, 3])).length).toBeLessThan(280);
});
