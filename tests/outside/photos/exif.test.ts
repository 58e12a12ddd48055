import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { takenTime } from '#server/images/exif-time.ts';
import { readFacts } from '#server/images/read-facts.ts';
import { swapsSides } from '#server/images/turn-upright.ts';
import { withExif } from '#tests/photos/exif.ts';
import { aJpeg } from '#tests/photos/pictures.ts';
import { casesOf, readCases } from '../bench-cases.ts';

const cases = readCases('exif');
const folder = mkdtempSync(join(tmpdir(), 'witnessmark-exif-'));
afterAll(() => rmSync(folder, { recursive: true }));

type Taken = Record<
  'DateTimeOriginal' | 'OffsetTimeOriginal' | 'SubSecTimeOriginal',
  string | null | undefined
>;

/** What ExifTool (Debian's libimage-exiftool-perl) reads of one tag. */
const exiftool = (file: string, tag: string) =>
  execFileSync('exiftool', ['-s3', '-n', `-${tag}`, file])
    .toString()
    .trim();

describe('instants out of Exif', () => {
  it.each(casesOf(cases, 'exif.instant', 5))('$id', (one) => {
    const { DateTimeOriginal, OffsetTimeOriginal, SubSecTimeOriginal } = one.inputs as Taken;
    const taken = takenTime(DateTimeOriginal, OffsetTimeOriginal, SubSecTimeOriginal);
    const { utc } = one.expected as { utc: string | null };
    expect(taken?.at?.getTime() ?? null).toBe(utc === null ? null : Date.parse(utc));
    expect(taken?.offset ?? null).toBe(OffsetTimeOriginal);
    expect(taken?.clock.slice(0, 10)).toBe(DateTimeOriginal?.slice(0, 10).replaceAll(':', '-'));
  });

  it.each([
    ['0000:00:00 00:00:00', 'never set'],
    ['2026:02:30 10:00:00', 'no day of the calendar'],
    ['2026:04:15 24:00:00', 'no hour'],
    ['    :  :     :  :  ', 'blank, as Exif writes unknown'],
    ['', 'empty'],
    [undefined, 'missing'],
    [20260415, 'no text'],
  ] as [unknown, string][])('%j is none: %s', (time) => {
    expect(takenTime(time, '+01:00', '1')).toBeNull();
  });

  it('takes a fraction as digits behind the point, and a zone only when it is one', () => {
    const clock = (fraction: unknown) => takenTime('2026:04:15 09:40:00', '', fraction)?.clock;
    expect(clock('5')).toBe('2026-04-15T09:40:00.500');
    expect(clock('016 ')).toBe('2026-04-15T09:40:00.016');
    expect(clock('123456')).toBe('2026-04-15T09:40:00.123');
    expect(clock('x')).toBe('2026-04-15T09:40:00');
    for (const offset of ['+15:00', '+01:60', '01:00', 'Z', '+1:00', 7])
      expect(takenTime('2026:04:15 09:40:00', offset, '')?.at, String(offset)).toBeNull();
  });
});

describe('a file with Exif, read by ExifTool and by us', () => {
  it('has the tags of the standard', async () => {
    const ids = new Map(
      casesOf(cases, 'exif.tag', 13).map(({ inputs, expected }) => [
        String(inputs.tag).split(' ')[0],
        expected.id,
      ]),
    );
    const file = join(folder, 'tags.jpg');
    const fields = {
      orientation: 6,
      time: '2026:03:08 01:59:59',
      offset: '-05:00',
      fraction: '250',
    };
    writeFileSync(file, withExif(await aJpeg(), fields));
    const printed = execFileSync('exiftool', ['-H', '-s', '-EXIF:all', file]).toString();
    for (const tag of [
      'Orientation',
      'DateTimeOriginal',
      'OffsetTimeOriginal',
      'SubSecTimeOriginal',
    ])
      expect(printed).toMatch(new RegExp(`${String(ids.get(tag))} ${tag} `));
  });

  it('is at the same instant, and at the same place, of which we keep only that it is there', async () => {
    const [place] = casesOf(cases, 'exif.gps', 4);
    const { degrees, minutes, seconds } = place?.inputs as Record<string, number>;
    const jpeg = withExif(await aJpeg(), {
      time: '2026:07:01 13:00:00',
      offset: '+01:00',
      latitude: [degrees ?? 0, minutes ?? 0, seconds ?? 0],
    });
    const file = join(folder, 'place.jpg');
    writeFileSync(file, jpeg);
    expect(Number(exiftool(file, 'GPSLatitude'))).toBeCloseTo(Number(place?.expected.decimal), 5);
    const facts = await readFacts(jpeg, 'image/jpeg');
    expect(exiftool(file, 'Composite:SubSecDateTimeOriginal')).toBe('2026:07:01 13:00:00+01:00');
    expect(facts).toEqual({
      orientation: 1,
      taken: {
        clock: '2026-07-01T13:00:00',
        offset: '+01:00',
        at: new Date('2026-07-01T12:00:00Z'),
      },
      hasPosition: true,
    });
    expect(JSON.stringify(facts)).not.toContain('40.44');
  });

  it.each(casesOf(cases, 'exif.orientation', 8))('orientation $inputs.value', async (one) => {
    const { value: orientation } = one.inputs as { value: number };
    const { to_display, swaps_width_height } = one.expected;
    const jpeg = withExif(await aJpeg(), { orientation });
    const file = join(folder, `orientation-${orientation}.jpg`);
    writeFileSync(file, jpeg);
    const words = execFileSync('exiftool', ['-s3', '-Orientation', file]).toString().trim();
    expect(words).toBe(to_display);
    expect((await readFacts(jpeg, 'image/jpeg')).orientation).toBe(orientation);
    expect(swapsSides(orientation)).toBe(swaps_width_height);
  });
});

describe('metadata that cannot be read', () => {
  it('is none, but may hold a position', async () => {
    const jpeg = withExif(await aJpeg(), { orientation: 6, time: '2026:07:01 13:00:00' });
    const broken = Buffer.from(jpeg);
    broken.fill(0xff, 14, 60);
    const facts = await readFacts(broken, 'image/jpeg');
    expect(facts).toMatchObject({ orientation: 1, taken: null });
  });

  it.each(['GPSLatitude', '\xa9xyz', 'com.apple.quicktime.location.ISO6709'])(
    'a position is noticed beside Exif too: %j',
    async (word) => {
      const file = Buffer.concat([await aJpeg(), Buffer.from(word, 'latin1')]);
      expect((await readFacts(file, 'image/jpeg')).hasPosition).toBe(true);
    },
  );
});
