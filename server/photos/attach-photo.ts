import { PhotoLinkSchema, type Visibility } from '#domain/entry-draft.ts';
import { NotFound } from '#domain/errors.ts';
import { parseInput } from '#domain/input.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { select, transaction } from '#server/db/sql.ts';
import { lockDraft } from '#server/entries/lock-draft.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';
import { linkPhoto } from './link-photo.ts';

/** A photo of a case for one of its drafts. What is left out stays, or is as the draft expects it. */
export interface PhotoToAttach {
  caseNumber: string;
  entryId: string;
  photoId: string;
  visibility?: Visibility;
  caption?: string | null;
}

const SaidSchema = PhotoLinkSchema.pick({ caption: true, visibility: true }).partial();

/**
 * Puts a photo of the case on a draft, or changes what the draft says of it.
 * Throws NotAllowed, NotFound for a case, entry or photo that is not there, Conflict once the entry
 * is sealed, Invalid with a sentence per field.
 */
export async function attachPhoto(
  viewer: Viewer,
  { caseNumber, entryId, photoId, visibility, caption }: PhotoToAttach,
): Promise<void> {
  demand(viewer, 'add photos and notes');
  const staff = staffOnly(viewer);
  const given = { ...(visibility && { visibility }), ...(caption !== undefined && { caption }) };
  const said = caption === undefined ? given : { ...given, ...parseInput(SaidSchema, given) };
  await transaction(async (tx) => {
    const { id: caseId } = await lockCase(tx, caseNumber);
    await lockDraft(tx, staff, { caseId, entryId });
    const [photo] = await select(
      'SELECT id FROM photos WHERE id = ? AND case_id = ?',
      [photoId, caseId],
      tx,
    );
    if (!photo) throw new NotFound('No such photo is on this case. Open the case again.');
    await linkPhoto(tx, { entryId, photoId, ...said });
    await touchCase(tx, caseId);
  });
}
