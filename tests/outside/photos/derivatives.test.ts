import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { derivePicture } from '#server/images/derive-picture.ts';
import { exifTiff, withExif, withJpegProfile } from '#tests/photos/exif.ts';
import { aJpeg, aPng, withPngChunk, withPngExif } from '#tests/photos/pictures.ts';
import { aProfile } from '#tests/photos/profile.ts';

const folder = mkdtempSync(join(tmpdir(), 'witnessmark-derivatives-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** Groups of metadata that ExifTool (Debian's libimage-exiftool-perl) finds in a file, its own, the system’s and those it works out left out. */
function groupsIn(bytes: Uint8Array, name: string): string[] {
  const file = join(folder, name);
  writeFileSync(file, bytes);
  const json = execFileSync('exiftool', ['-j', '-G1', '-a', '-u', '-ee', file]).toString();
  const [tags = {}] = JSON.parse(json) as Record<string, unknown>[];
  const groups = Object.keys(tags).map((tag) => tag.split(':')[0] ?? tag);
  return [...new Set(groups)].filter(
    (group) => !/^(SourceFile|ExifTool|System|File|Composite)$/.test(group),
  );
}

const everything = { orientation: 6, time: '2026:03:08 01:59:59', latitude: [12, 30, 15] } as const;
const xmp = Buffer.from(
  '<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description xmlns:exif="http://ns.adobe.com/exif/1.0/" exif:GPSLatitude="12,30.25N"/></rdf:RDF></x:xmpmeta>',
);

async function jpegWithEverything(profile: Buffer | null): Promise<Buffer> {
  const plain = await aJpeg({ width: 480, height: 320 });
  const withPlace = withExif(plain, { ...everything, latitude: [12, 30, 15] });
  const head = Buffer.from([0xff, 0xe1, 0, 0]);
  const body = Buffer.concat([Buffer.from('http://ns.adobe.com/xap/1.0/\0'), xmp]);
  head.writeUInt16BE(body.length + 2, 2);
  const all = Buffer.concat([withPlace.subarray(0, 2), head, body, withPlace.subarray(2)]);
  return profile === null ? all : withJpegProfile(all, profile);
}

describe('what ExifTool finds in a copy', () => {
  it('finds it in the original, so that it would find it in a copy', async () => {
    const groups = groupsIn(await jpegWithEverything(aProfile(2_000)), 'original.jpg');
    expect(groups).toEqual(expect.arrayContaining(['IFD0', 'GPS', 'XMP-exif', 'ICC-header']));
  });

  it('is the picture and its colour profile, nothing else', async () => {
    const { copies } = await derivePicture(await jpegWithEverything(aProfile(2_000)), 'image/jpeg');
    for (const { edge, bytes } of copies) {
      const groups = groupsIn(bytes, `${edge}.webp`);
      expect(groups.sort()).toEqual(['ICC-header', 'ICC_Profile', 'RIFF']);
    }
  });

  it('is the picture alone where there is no profile', async () => {
    const { copies } = await derivePicture(await jpegWithEverything(null), 'image/jpeg');
    for (const { edge, bytes } of copies)
      expect(groupsIn(bytes, `plain-${edge}.webp`)).toEqual(['RIFF']);
  });

  it('is the picture alone from a PNG with Exif and words', async () => {
    const words = Buffer.from('Comment\0taken at 12 Harbour Row');
    const png = withPngExif(withPngChunk(await aPng(), 'tEXt', words), {
      ...everything,
      latitude: [12, 30, 15],
    });
    expect(groupsIn(png, 'words.png')).toEqual(expect.arrayContaining(['PNG', 'GPS']));
    const { copies } = await derivePicture(png, 'image/png');
    for (const { bytes } of copies) {
      expect(groupsIn(bytes, 'from-png.webp')).toEqual(['RIFF']);
      expect(bytes.includes('Harbour')).toBe(false);
      expect(bytes.includes(exifTiff({ latitude: [12, 30, 15] }).subarray(-24))).toBe(false);
    }
  });
});
