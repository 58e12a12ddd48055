import { createHash, randomBytes } from 'node:crypto';
import { Readable } from 'node:stream';
import { v7 } from 'uuid';
import { EntryDraftSchema } from '#domain/entry-draft.ts';
import type { StaffViewer } from '#domain/viewer.ts';
import { run, select } from '#server/db/sql.ts';
import { putStream } from '#server/storage/put-stream.ts';
import type { TestCase } from './shop.ts';

export interface DraftOptions {
  title?: string;
  text?: string;
  benchNote?: string;
  phase?: 'before' | 'during' | 'after';
  visibility?: 'shared' | 'bench';
  occurredAt?: Date | null;
  minutes?: number | null;
}

/** Writes a draft by `writer` into the case. Returns the entry's id. */
export async function writeDraft(
  repair: TestCase,
  writer: StaffViewer,
  options: DraftOptions = {},
): Promise<string> {
  const { phase = 'during', visibility = 'shared', occurredAt = null, ...words } = options;
  const id = v7();
  const draft = EntryDraftSchema.parse({
    title: 'Bridge lifted',
    text: 'With a warm knife.',
    ...words,
  });
  await run(
    `INSERT INTO entries (id, case_id, kind, phase, visibility, draft, occurred_at, written_by, written_at, edited_at)
     VALUES (?, ?, 'entry', ?, ?, ?, ?, ?, NOW(3), NOW(3))`,
    [id, repair.id, phase, visibility, JSON.stringify(draft), occurredAt, writer.personId],
  );
  return id;
}

const sha256 = (text: string) => createHash('sha256').update(text).digest();

/** Adds a photo row that is ready, with its published copy, to an entry. Returns its number. */
export async function addPhoto(
  repair: TestCase,
  entryId: string,
  uploader: StaffViewer,
  {
    visibility = 'shared',
    caption = 'Bridge from behind, gap under its back edge',
    state = 'ready',
    copyKey = `copies/${randomBytes(20).toString('hex')}`,
    copySha256 = sha256(copyKey),
    stored = false,
  }: {
    visibility?: 'shared' | 'bench';
    caption?: string;
    state?: 'ready' | 'waiting' | 'failed';
    copyKey?: string;
    copySha256?: Buffer;
    /** Whether the files are in the store too; each holds its own key. */
    stored?: boolean;
  } = {},
): Promise<number> {
  const [last] = await select<{ n: number | null }>(
    'SELECT MAX(number) AS n FROM photos WHERE case_id = ?',
    [repair.id],
  );
  const n = (last?.n ?? 0) + 1;
  const photoId = v7();
  const key = `originals/${randomBytes(20).toString('hex')}`;
  await run(
    `INSERT INTO photos (id, case_id, number, sha256, bytes, media_type, object_key, uploaded_by,
                         received_at, state, width, height)
     VALUES (?, ?, ?, ?, 1000, 'image/jpeg', ?, ?, NOW(3), ?, 4000, 3000)`,
    [photoId, repair.id, n, sha256(key), key, uploader.personId, state],
  );
  if (state === 'ready') {
    await run(
      `INSERT INTO photo_copies (photo_id, edge, object_key, sha256, bytes, width, height)
       VALUES (?, 2048, ?, ?, 500, 2048, 1536)`,
      [photoId, copyKey, copySha256],
    );
  }
  if (stored) {
    for (const file of [key, copyKey]) {
      const bytes = Buffer.from(file);
      await putStream(file, Readable.from([bytes]), {
        length: bytes.length,
        mediaType: 'image/webp',
      });
    }
  }
  await run(
    'INSERT INTO entry_photos (id, entry_id, photo_id, visibility, caption) VALUES (?, ?, ?, ?, ?)',
    [v7(), entryId, photoId, visibility, caption],
  );
  return n;
}
