import { Jimp } from 'jimp';
import { describe, expect, it } from 'vitest';
import { cmykJpeg } from '#tests/photos/cmyk.ts';
import { exifTiff, withExif, withJpegProfile } from '#tests/photos/exif.ts';
import {
  aJpeg,
  aLargeJpeg,
  aPng,
  aWebp,
  cornerColour,
  cornersPicture,
  nearestCorner,
  withPngExif,
  withPngProfile,
} from '#tests/photos/pictures.ts';
import { heicShell } from '#tests/photos/heic.ts';
import { aProfile } from '#tests/photos/profile.ts';
import { derivePicture } from './derive-picture.ts';
import { readProfile } from './read-profile.ts';
import { decodeWebp } from './webp-codec.ts';
import { chunksIn, webpOf } from './webp-chunks.ts';

type Stored = (upright: ReturnType<typeof cornersPicture>) => unknown;

// Each stored picture is made from the upright one by jimp, as the inverse of what Exif says is to be
// done for display; the names are ExifTool 12.57's. jimp turns counter-clockwise.
const STORED: [orientation: number, toDisplay: string, stored: Stored][] = [
  [1, 'Horizontal (normal)', () => undefined],
  [2, 'Mirror horizontal', (p) => p.flip({ horizontal: true })],
  [3, 'Rotate 180', (p) => p.rotate(180)],
  [4, 'Mirror vertical', (p) => p.flip({ vertical: true })],
  [5, 'Mirror horizontal and rotate 270 CW', (p) => p.rotate(-90).flip({ horizontal: true })],
  [6, 'Rotate 90 CW', (p) => p.rotate(90)],
  [7, 'Mirror horizontal and rotate 90 CW', (p) => p.rotate(90).flip({ horizontal: true })],
  [8, 'Rotate 270 CW', (p) => p.rotate(-90)],
];

async function cornersOf(webp: Uint8Array): Promise<number[]> {
  const pixels = await decodeWebp(webp);
  return [0, 1, 2, 3].map((corner) => nearestCorner(cornerColour(pixels, corner)));
}

describe('orientation', () => {
  it.each(STORED)('%i, "%s", comes upright', async (orientation, _name, turn) => {
    const picture = cornersPicture(480, 320);
    turn(picture);
    const jpeg = await picture.getBuffer('image/jpeg', { quality: 90 });
    const made = await derivePicture(withExif(jpeg, { orientation }), 'image/jpeg');
    expect(made).toMatchObject({ width: 480, height: 320 });
    expect(made.facts.orientation).toBe(orientation);
    for (const { bytes, edge, width, height } of made.copies) {
      expect([width, height], `size of ${edge}`).toEqual(edge === 320 ? [320, 213] : [480, 320]);
      expect(await cornersOf(bytes), `corners of ${edge}`).toEqual([0, 1, 2, 3]);
    }
  });

  it('counts for PNG and WebP too', async () => {
    const png = withPngExif(await aPng(480, 320), { orientation: 3 });
    const fromPng = await derivePicture(png, 'image/png');
    expect(await cornersOf(fromPng.copies[0]?.bytes ?? png)).toEqual([3, 2, 1, 0]);

    const chunks = [...chunksIn(await aWebp(480, 320))];
    const head = Buffer.alloc(10);
    head[0] = 0x08;
    head.writeUIntLE(479, 4, 3);
    head.writeUIntLE(319, 7, 3);
    const webp = webpOf([
      { type: 'VP8X', body: head },
      ...chunks,
      { type: 'EXIF', body: exifTiff({ orientation: 6 }) },
    ]);
    const fromWebp = await derivePicture(webp, 'image/webp');
    expect(fromWebp).toMatchObject({ width: 320, height: 480 });
    expect(await cornersOf(fromWebp.copies[0]?.bytes ?? webp)).toEqual([2, 0, 3, 1]);
  });

  it('that is no orientation leaves the picture as it is', async () => {
    const made = await derivePicture(withExif(await aJpeg(), { orientation: 9 }), 'image/jpeg');
    expect(made.facts.orientation).toBe(1);
    expect(await cornersOf(made.copies[0]?.bytes ?? Buffer.alloc(0))).toEqual([0, 1, 2, 3]);
  });
});

describe('the copies', () => {
  it('have the three long sides, the largest first, and a placeholder', async () => {
    const made = await derivePicture(await aLargeJpeg(2400, 1600), 'image/jpeg');
    expect(made.copies.map(({ edge, width, height }) => [edge, width, height])).toEqual([
      [2048, 2048, 1365],
      [960, 960, 640],
      [320, 320, 213],
    ]);
    expect(made).toMatchObject({ width: 2400, height: 1600 });
    expect(made.placeholder.length).toBeGreaterThan(10);
    expect(made.placeholder.length).toBeLessThanOrEqual(40);
  });

  it('are never larger than the photo', async () => {
    const { copies } = await derivePicture(await aPng(200, 100), 'image/png');
    expect(copies.map(({ width, height }) => [width, height])).toEqual(Array(3).fill([200, 100]));
  });

  it('keep at least one pixel of a very thin picture', async () => {
    const { copies } = await derivePicture(await aPng(3000, 1), 'image/png');
    expect(copies.map(({ height }) => height)).toEqual([1, 1, 1]);
  });

  it('stay as transparent as the photo', async () => {
    const picture = new Jimp({ width: 400, height: 400, color: 0x20a04080 });
    const { copies } = await derivePicture(await picture.getBuffer('image/png'), 'image/png');
    const { data } = await decodeWebp(copies[2]?.bytes ?? Buffer.alloc(0));
    expect(data[3]).toBeGreaterThan(120);
    expect(data[3]).toBeLessThan(136);
  });
});

describe('the colour profile', () => {
  it('goes into every copy, byte for byte, from JPEG, PNG and WebP', async () => {
    const profile = aProfile(9_000);
    const jpeg = withJpegProfile(await aJpeg(), profile, 4_000);
    const fromJpeg = await derivePicture(jpeg, 'image/jpeg');
    for (const { bytes } of fromJpeg.copies) {
      const chunks = [...chunksIn(bytes)];
      expect(chunks.map(({ type }) => type)).toEqual(['VP8X', 'ICCP', 'VP8 ']);
      expect(Buffer.from(chunks[1]?.body ?? []).equals(profile)).toBe(true);
    }
    const fromPng = await derivePicture(withPngProfile(await aPng(), profile), 'image/png');
    const again = await derivePicture(fromPng.copies[0]?.bytes ?? jpeg, 'image/webp');
    const [, iccp] = [...chunksIn(again.copies[1]?.bytes ?? jpeg)];
    expect(Buffer.from(iccp?.body ?? []).equals(profile)).toBe(true);
  });

  it('is found in HEIC', () => {
    const profile = aProfile(600);
    const found = readProfile(heicShell({ profile }), 'image/heic');
    expect(found && profile.equals(found)).toBe(true);
    expect(readProfile(heicShell(), 'image/heic')).toBeNull();
  });

  it('is left out when it is none, is for other colours, or hides something behind itself', async () => {
    const types = async (jpeg: Buffer) => {
      const { copies } = await derivePicture(jpeg, 'image/jpeg');
      return [...chunksIn(copies[0]?.bytes ?? jpeg)];
    };
    const plain = await aJpeg();
    expect((await types(plain)).map(({ type }) => type)).toEqual(['VP8 ']);
    const grey = aProfile(400);
    grey.write('GRAY', 16, 'latin1');
    expect(await types(withJpegProfile(plain, grey))).toHaveLength(1);
    expect(await types(withJpegProfile(plain, Buffer.alloc(400, 65)))).toHaveLength(1);
    const hidden = Buffer.concat([aProfile(400), Buffer.from('40.446 N')]);
    const [, iccp] = await types(withJpegProfile(plain, hidden));
    expect(iccp?.body).toHaveLength(400);
  });
});

describe('a JPEG the fast decoder gives up on', () => {
  it('is read by the slower one: CMYK', async () => {
    const { copies, width, height } = await derivePicture(cmykJpeg(), 'image/jpeg');
    expect([width, height]).toEqual([8, 8]);
    const { data } = await decodeWebp(copies[0]?.bytes ?? Buffer.alloc(0));
    const [red = 0, green = 0, blue = 0] = data;
    // Half of each ink over half of black.
    for (const value of [red, green, blue]) expect(Math.abs(value - 64)).toBeLessThan(6);
  });
});

describe('a file that cannot be decoded', () => {
  it('throws', async () => {
    const png = await aPng();
    const empty = Buffer.from(png);
    empty.fill(0, empty.indexOf('IDAT') + 4, empty.length - 16);
    await expect(derivePicture(empty, 'image/png')).rejects.toThrow();
    await expect(derivePicture(Buffer.from('no picture'), 'image/jpeg')).rejects.toThrow();
    await expect(derivePicture(Buffer.alloc(40), 'image/webp')).rejects.toThrow();
    await expect(derivePicture(Buffer.alloc(40), 'image/heic')).rejects.toThrow();
  });
});
