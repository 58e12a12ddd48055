import { v7 } from 'uuid';
import type { EntryDraft, PhotoLink, Visibility } from '#domain/entry-draft.ts';
import { run, select, type Transaction } from '#server/db/sql.ts';

/** A link to be made between a draft and a photo of its case. The case's row is locked. */
export interface LinkToMake {
  entryId: string;
  photoId: string;
  /** The id the draft's form knows the photo by: another one when the same file was there before. */
  expectedAs?: string;
  /** Left out: what the draft says of the photo it expects, or the entry's own. */
  visibility?: Visibility;
  caption?: string | null;
}

interface DraftRow {
  visibility: Visibility;
  draft: string;
}

async function forget(tx: Transaction, entryId: string, draft: EntryDraft, id: string) {
  const expected = draft.expected.filter(({ photoId }) => photoId !== id);
  if (expected.length === draft.expected.length) return;
  const rest = JSON.stringify({ ...draft, expected });
  await run('UPDATE entries SET draft = ? WHERE id = ?', [rest, entryId], tx);
}

/** Links a photo to a draft; linked already, only what is given changes. In an entry for the bench every photo is for the bench. */
export async function linkPhoto(
  tx: Transaction,
  { entryId, photoId, expectedAs = photoId, visibility, caption }: LinkToMake,
): Promise<void> {
  const [entry] = await select<DraftRow>(
    'SELECT visibility, draft FROM entries WHERE id = ? AND leaf_index IS NULL',
    [entryId],
    tx,
  );
  if (entry === undefined) return;
  const draft = JSON.parse(entry.draft) as EntryDraft;
  const said: Partial<PhotoLink> = draft.expected.find((link) => link.photoId === expectedAs) ?? {};
  const seenBy = visibility ?? said.visibility ?? entry.visibility;
  const given = visibility !== undefined || said.visibility !== undefined;
  const words = caption === undefined ? said.caption : caption;
  await run(
    `INSERT INTO entry_photos (id, entry_id, photo_id, visibility, caption)
     VALUES (:id, :entryId, :photoId, :visibility, :caption)
     ON DUPLICATE KEY UPDATE
       visibility = IF(:given, VALUES(visibility), visibility),
       caption = IF(:worded, VALUES(caption), caption)`,
    {
      id: v7(),
      entryId,
      photoId,
      visibility: entry.visibility === 'bench' ? 'bench' : seenBy,
      caption: words ?? null,
      given,
      worded: words !== undefined,
    },
    tx,
  );
  await forget(tx, entryId, draft, expectedAs);
}
