import { createHash } from 'node:crypto';
import { Readable } from 'node:stream';
import { encodeWebp } from '#server/images/webp-codec.ts';
import { run, select } from '#server/db/sql.ts';
import { newKey } from '#server/storage/keys.ts';
import { putStream } from '#server/storage/put-stream.ts';
import type { TestCase } from './shop.ts';

/** Gives a photo of the case a copy of 960 px, a plain colour, in the store. */
export async function keepCopy(repair: TestCase, n: number, shade: number): Promise<void> {
  const [width, height] = [960, 720];
  const data = Buffer.alloc(width * height * 4, shade);
  const webp = Buffer.from(await encodeWebp({ data, width, height }, 80));
  const key = newKey('copies');
  await putStream(key, Readable.from([webp]), { length: webp.length, mediaType: 'image/webp' });
  const [photo] = await select<{ id: string }>(
    'SELECT id FROM photos WHERE case_id = ? AND number = ?',
    [repair.id, n],
  );
  await run(
    `INSERT INTO photo_copies (photo_id, edge, object_key, sha256, bytes, width, height)
     VALUES (?, 960, ?, ?, ?, ?, ?)`,
    [photo!.id, key, createHash('sha256').update(webp).digest(), webp.length, width, height],
  );
}
