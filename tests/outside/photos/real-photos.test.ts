import { execFileSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Problem } from '#domain/errors.ts';
import { SNIFFED_BYTES, sniffPhoto } from '#domain/photo-file.ts';
import { select } from '#server/db/sql.ts';
import { picturePool } from '#server/images/picture-pool.ts';
import type { Pixels } from '#server/images/pixels.ts';
import { turnUpright } from '#server/images/turn-upright.ts';
import { decodeWebp } from '#server/images/webp-codec.ts';
import { derivePhoto } from '#server/photos/derive-photo.ts';
import { putPhoto } from '#server/photos/put-photo.ts';
import { getStream } from '#server/storage/objects.ts';
import { inPieces, sent, sha256Of, whatIsKept } from '#tests/photos/sending.ts';
import { setUpShop, takeInCase, type TestCase, type TestShop } from '#tests/record/shop.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { useStore } from '#tests/setup/store.ts';

// Photographs from real cameras and phones, which are not part of the project. vitest.config.ts leaves
// this file out of the run, and says so, unless WITNESSMARK_REAL_PHOTOS names their folder.
const folder = process.env.WITNESSMARK_REAL_PHOTOS ?? '';
const names = readdirSync(folder).filter((name) => /\.(jpe?g|png|webp|hei[cf])$/i.test(name));
const scratch = mkdtempSync(join(tmpdir(), 'witnessmark-real-'));

useDatabase();
useStore();

let shop: TestShop;
let repair: TestCase;
beforeAll(async () => {
  shop = await setUpShop();
  repair = await takeInCase(shop);
});
afterAll(() => {
  picturePool.end();
  rmSync(scratch, { recursive: true });
});

interface CopyRow {
  edge: number;
  object_key: string;
  sha256: Buffer;
  bytes: number;
  width: number;
  height: number;
}

async function objectOf(key: string): Promise<Buffer> {
  const stream = await getStream(key);
  return stream === undefined ? Buffer.alloc(0) : buffer(stream);
}

/** Groups of tags that ExifTool finds beside the file's own. */
function groupsIn(bytes: Buffer): string[] {
  const file = join(scratch, 'copy.webp');
  writeFileSync(file, bytes);
  const [tags = {}] = JSON.parse(
    execFileSync('exiftool', ['-j', '-G1', '-a', '-u', '-ee', file]).toString(),
  ) as Record<string, unknown>[];
  const groups = new Set(Object.keys(tags).map((tag) => tag.split(':')[0] ?? tag));
  for (const own of ['SourceFile', 'ExifTool', 'System', 'File', 'Composite']) groups.delete(own);
  return [...groups].sort();
}

/** Width and height as ExifTool says the picture is to be seen. HEIC is turned by its own `irot`. */
function sidesOf(name: string): number[] {
  const tags = ['-ImageWidth', '-ImageHeight', '-Orientation', '-Rotation', '-FileType'];
  const args = ['-j', '-n', ...tags, join(folder, name)];
  const [found = {}] = JSON.parse(execFileSync('exiftool', args).toString()) as Record<
    string,
    number | string
  >[];
  const sides = [Number(found.ImageWidth), Number(found.ImageHeight)];
  const swapped =
    found.FileType === 'HEIC' ? Number(found.Rotation) % 180 !== 0 : Number(found.Orientation) > 4;
  return swapped ? sides.reverse() : sides;
}

const upright = new Map<string, Pixels>();

describe('a photograph from a real camera', { timeout: 120_000 }, () => {
  it.each(names)('%s', async (name) => {
    const file = readFileSync(join(folder, name));
    const mediaType = sniffPhoto(file.subarray(0, SNIFFED_BYTES));
    const before = await whatIsKept();
    const input = sent(repair.number, file, { mediaType, fileName: name });
    const put = await putPhoto(shop.technician, input, inPieces(file)).catch((error: unknown) => {
      if (error instanceof Problem) return error.sentence;
      throw error;
    });
    if (typeof put === 'string') {
      console.log(`${name}: refused. ${put}`);
      expect(await whatIsKept()).toEqual(before);
      return;
    }

    await derivePhoto({ photoId: put.photo.id });
    const [row] = await select<{
      object_key: string;
      state: string;
      failed_because: string | null;
      width: number;
      height: number;
      taken_clock: string | null;
      taken_offset: string | null;
      has_position: number;
    }>('SELECT * FROM photos WHERE id = ?', [put.photo.id]);
    if (!row) return expect.unreachable('the photo has no row');
    expect(sha256Of(await objectOf(row.object_key)), 'the original').toBe(sha256Of(file));
    if (row.state === 'failed') {
      console.log(`${name}: kept, not shown. ${row.failed_because}`);
      expect(row.failed_because).toMatch(/^This photo cannot be shown: /);
      return;
    }

    expect(row.state).toBe('ready');
    expect([row.width, row.height], 'upright size').toEqual(sidesOf(name));
    const copies = await select<CopyRow>(
      'SELECT * FROM photo_copies WHERE photo_id = ? ORDER BY edge DESC',
      [put.photo.id],
    );
    expect(copies.map(({ edge }) => edge)).toEqual([2048, 960, 320]);
    for (const copy of copies) {
      const bytes = await objectOf(copy.object_key);
      expect(sha256Of(bytes)).toBe(copy.sha256.toString('hex'));
      expect(Math.max(copy.width, copy.height)).toBeLessThanOrEqual(copy.edge);
      const groups = groupsIn(bytes);
      for (const group of groups)
        expect(group, `metadata in the copy of ${copy.edge}`).toMatch(/^(RIFF|ICC[-_].+)$/);
      if (copy.edge === 320) upright.set(name, await decodeWebp(bytes));
    }
    const sizes = copies.map((copy) => `${copy.width}×${copy.height} ${copy.bytes} B`).join(', ');
    const taken = row.taken_clock ? `${row.taken_clock}${row.taken_offset ?? ' zone unknown'}` : '';
    console.log(
      `${name}: ${row.width}×${row.height} → ${sizes}; taken ${taken || 'not said'}; position ${row.has_position ? 'yes' : 'no'}; original equal`,
    );
  });
});

/** How far two pictures of one size are apart, of 255 on average. */
function apart(one: Pixels, other: Pixels): number {
  if (one.width !== other.width || one.height !== other.height) return 255;
  const sum = one.data.reduce((all, value, at) => all + Math.abs(value - (other.data[at] ?? 0)), 0);
  return sum / one.data.length;
}

describe('the photographs of one scene in eight orientations', () => {
  it('all come upright and alike: turned in any way they fit the first much less', () => {
    const scene = [...upright].filter(([name]) => name.includes('orientation'));
    const [first] = scene;
    if (first === undefined) return expect.unreachable('there are none in the folder');
    expect(scene).toHaveLength(8);
    for (const [name, picture] of scene) {
      const asItIs = apart(picture, first[1]);
      const turned = [2, 3, 4, 5, 6, 7, 8].map((way) => apart(turnUpright(picture, way), first[1]));
      const nearest = Math.min(...turned);
      console.log(`${name}: ${asItIs.toFixed(1)} apart, turned at least ${nearest.toFixed(1)}`);
      expect(asItIs, name).toBeLessThan(nearest / 3);
    }
  });
});
