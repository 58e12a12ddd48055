import { beforeAll, describe, expect, it } from 'vitest';
import { exifTiff, withExif } from '#tests/photos/exif.ts';
import { heicShell } from '#tests/photos/heic.ts';
import { aJpeg, aPng, aWebp, pngHeader } from '#tests/photos/pictures.ts';
import { PhotoWalk } from './walk-photo.ts';
import { webpOf } from './webp-chunks.ts';

const SIZES = [1, 7, 4096, Infinity];

/** Walks a file in pieces of `size` bytes. */
function walk(file: Uint8Array, size = 7): PhotoWalk {
  const seen = new PhotoWalk();
  const step = Math.min(size, Math.max(1, file.length));
  for (let at = 0; at < file.length; at += step) seen.push(file.subarray(at, at + step));
  seen.end();
  return seen;
}

let files: Record<'jpeg' | 'png' | 'webp' | 'heic', Buffer>;
beforeAll(async () => {
  files = { jpeg: await aJpeg(), png: await aPng(), webp: await aWebp(), heic: heicShell() };
});

describe('a whole photo', () => {
  it.each([
    ['jpeg', 'image/jpeg', 96, 64],
    ['png', 'image/png', 96, 64],
    ['webp', 'image/webp', 96, 64],
    ['heic', 'image/heic', 4032, 3024],
  ] as const)(
    '%s is known by kind and size, in pieces of any length',
    (name, type, width, height) => {
      for (const size of SIZES) {
        expect(walk(files[name], size)).toMatchObject({ mediaType: type, width, height });
      }
    },
  );

  it('may have more behind it, as phones put films and further pictures there', () => {
    const tail = Buffer.from('and more');
    expect(walk(Buffer.concat([files.jpeg, tail])).width).toBe(96);
    expect(walk(Buffer.concat([files.png, tail])).width).toBe(96);
    expect(walk(Buffer.concat([files.webp, tail])).width).toBe(96);
  });

  it('is not taken for its thumbnail, which has an end of its own', () => {
    const thumbnail = Buffer.concat([Buffer.from('Exif\0\0'), exifTiff({}), files.jpeg]);
    const app1 = Buffer.concat([Buffer.from([0xff, 0xe1, 0, 0]), thumbnail]);
    app1.writeUInt16BE(thumbnail.length + 2, 2);
    const whole = Buffer.concat([files.jpeg.subarray(0, 2), app1, files.jpeg.subarray(2)]);
    expect(walk(whole).width).toBe(96);
    expect(() => walk(whole.subarray(0, whole.length - 40))).toThrow('stops before its end');
  });

  it('keeps its size apart from its orientation', () => {
    expect(walk(withExif(files.jpeg, { orientation: 6 }))).toMatchObject({ width: 96, height: 64 });
  });

  it('may end with a HEIC box that reaches to the end of the file', () => {
    const open = Buffer.from(files.heic);
    open.writeUInt32BE(0, open.indexOf('mdat') - 4);
    expect(walk(open).width).toBe(4032);
  });
});

describe('a photo that is cut', () => {
  it.each(['jpeg', 'png', 'webp', 'heic'] as const)('%s, wherever it is cut', (name) => {
    const file = files[name];
    const cuts = [40, Math.floor(file.length / 3), Math.floor(file.length / 2), file.length - 1];
    for (const cut of cuts) {
      expect(() => walk(file.subarray(0, cut)), `at ${cut}`).toThrow(
        'This photo stops before its end. Copy it again from the camera, or take it again.',
      );
    }
  });
});

describe('a photo that is damaged', () => {
  const damagedSentence = 'This photo is damaged inside.';

  it('PNG, by any bit of its chunks', () => {
    for (const at of [20, files.png.indexOf('IDAT') + 9, files.png.length - 6]) {
      const flipped = Buffer.from(files.png);
      flipped[at] = (flipped[at] ?? 0) ^ 0x10;
      expect(() => walk(flipped), `at ${at}`).toThrow(damagedSentence);
    }
  });

  it('JPEG without a frame or without a scan', () => {
    const soi = Buffer.from([0xff, 0xd8]);
    const eoi = Buffer.from([0xff, 0xd9]);
    const fill = Buffer.from([0xff, 0xfe, 0, 30, ...Buffer.alloc(28)]);
    expect(() => walk(Buffer.concat([soi, fill, eoi]))).toThrow(damagedSentence);
  });

  it('HEIC whose meta box is missing', () => {
    const [head, rest] = [files.heic.subarray(0, 24), files.heic.subarray(24)];
    expect(() => walk(Buffer.concat([head, rest.subarray(rest.indexOf('mdat') - 4)]))).toThrow(
      damagedSentence,
    );
  });
});

describe('what is no photo for the shop', () => {
  it('nothing at all', () => {
    expect(() => walk(new Uint8Array())).toThrow('This file is empty. Choose the photo again.');
  });

  it('words', () => {
    const words = Buffer.from('Bridge lifted along its back edge, paper goes in.');
    expect(() => walk(words)).toThrow(
      'This file is not a photo the shop can read. Send JPEG, PNG, WebP or HEIC.',
    );
    expect(() => walk(words.subarray(0, 3))).toThrow('not a photo the shop can read');
  });

  it('a picture of 200 million pixels, before any of it is decoded', () => {
    expect(() => walk(pngHeader(20_000, 10_000).subarray(0, 40))).toThrow(
      'This picture has 200 million pixels and the shop takes 65. Make it smaller and send it again.',
    );
  });

  it('but one of 48 million passes', () => {
    expect(walk(pngHeader(8064, 6048))).toMatchObject({ width: 8064, height: 6048 });
    expect(walk(heicShell({ width: 8064, height: 6048 }))).toMatchObject({ width: 8064 });
  });

  it('a moving WebP', () => {
    const head = Buffer.alloc(10);
    head[0] = 0x02;
    const moving = webpOf([
      { type: 'VP8X', body: head },
      { type: 'ANIM', body: Buffer.alloc(6) },
    ]);
    expect(() => walk(moving)).toThrow('This file is a moving picture. Send a still photo.');
  });

  it('a picture without a side', () => {
    expect(() => walk(pngHeader(0, 10))).toThrow('damaged inside');
  });
});
