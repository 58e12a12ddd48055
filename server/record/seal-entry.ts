import { Conflict } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { isStoryKind, type CaseKind } from '#evidence/seal/kinds.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, transaction, type Transaction } from '#server/db/sql.ts';
import { appendEntry, type Appended } from '#server/evidence/append-entry.ts';
import { correctedEntry } from './corrected-entry.ts';
import { draftToSeal, type DraftToSeal } from './draft-to-seal.ts';
import { entryParts } from './entry-parts.ts';
import { lockCase, staffOnly } from './lock-case.ts';
import { partyParts } from './party-parts.ts';
import { mailOwner } from './mail-owner.ts';

/** What was sealed: the index of its leaf and its leaf hash in hex. */
export interface Sealed {
  leafIndex: number;
  leafHash: string;
}

function kindOf({ kind }: DraftToSeal): CaseKind {
  if (kind === 'amendment' || isStoryKind(kind)) return kind;
  throw new Error(`A draft of kind ${kind} is not sealed by hand.`);
}

/** The words now live in the sealed parts alone; the salts stay with the photos. */
async function moveWords(
  tx: Transaction,
  entry: DraftToSeal,
  appended: Appended,
  personId: string,
): Promise<void> {
  await run(
    'UPDATE entries SET draft = NULL, leaf_index = ?, sealed_at = ?, sealed_by = ? WHERE id = ?',
    [appended.leafIndex, appended.recordedAt, personId, entry.id],
    tx,
  );
  for (const { linkId, n, visibility } of entry.photos) {
    const salts = appended.photoSalts.get(n);
    if (!salts) throw new Error(`Photo ${n} was sealed without salts.`);
    await run(
      `UPDATE entry_photos SET caption = NULL, visibility = ?, original_salt = ?, published_salt = ?
       WHERE id = ?`,
      [visibility, salts.original, salts.published, linkId],
      tx,
    );
    await run('DELETE FROM pins WHERE entry_photo_id = ?', [linkId], tx);
  }
}

/**
 * Seals a draft: from then on it cannot be changed, and if it is shared the owner sees it and is
 * told. A correction names the entry it corrects and may be sealed after the case is closed.
 * @throws NotFound for an unknown case or entry; NotAllowed by role; Conflict when it is sealed
 *   already, the case is closed, a photo is not ready or the clock is behind; TooLarge
 */
export async function sealEntry(
  viewer: Viewer,
  { caseNumber, entryId }: { caseNumber: string; entryId: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<Sealed> {
  const staff = staffOnly(viewer);
  return transaction(async (tx) => {
    const repair = await lockCase(tx, caseNumber);
    const entry = await draftToSeal(tx, repair.id, entryId);
    demand(viewer, 'seal', { own: entry.writtenBy === staff.personId });
    const kind = kindOf(entry);
    if (repair.closedAt && kind !== 'amendment') {
      throw new Conflict(
        'This case is closed: nothing is added to it any more. To correct an entry, add a correction beside it.',
      );
    }
    const corrected = kind === 'amendment' ? await correctedEntry(tx, entry) : null;
    const appended = await appendEntry(tx, {
      chain: repair.record,
      kind,
      visibility: entry.visibility,
      // What is for the bench only tells no time outside its own part.
      occurredAt: entry.visibility === 'shared' ? entry.occurredAt : null,
      parts: {
        ...entryParts(entry, corrected?.photos ?? [], staff),
        ...(await partyParts(tx, repair.id, entry.id)),
      },
      photos: entry.photos,
      names: corrected ? [corrected.commitment] : [],
      now,
    });
    await moveWords(tx, entry, appended, staff.personId);
    await touchCase(tx, repair.id);
    await recordAct(tx, staff, { act: 'sealed an entry', caseId: repair.id, subjectId: entry.id });
    if (entry.visibility === 'shared') {
      const { title } = entry.draft;
      await mailOwner(tx, repair.id, `entry-shared/${entry.id}`, (about) => ({
        template: 'entry-shared',
        data: { ...about, title },
      }));
    }
    return { leafIndex: appended.leafIndex, leafHash: appended.leafHash.toString('hex') };
  });
}
