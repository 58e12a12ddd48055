import { v7 } from 'uuid';
import { z } from 'zod';
import { NotFound } from '#domain/errors.ts';
import { neededText, parseInput, text } from '#domain/input.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { Pin } from '#server/db/models/pin.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { lockDraft } from '#server/entries/lock-draft.ts';
import { lockCase, staffOnly } from '#server/record/lock-case.ts';

const OUTSIDE = 'This pin is outside the photo. Set it again.';

const place = z.coerce
  .number(OUTSIDE)
  .min(0, OUTSIDE)
  .max(100, OUTSIDE)
  .transform((percent) => Math.round(percent * 100));

const PinsSchema = z.object({
  pins: z
    .array(
      z.object({
        /** Percent of the upright photo from its left and its top. */
        x: place,
        y: place,
        kind: z.enum(['damage', 'remark'], 'Is it damage or a remark? Choose one.'),
        label: neededText('The pin’s title', 120, 'The pin has no title. Write what is there.'),
        note: text('The pin’s note', 400),
      }),
    )
    .max(40, 'Forty pins are the most a photo holds. Take some off.'),
});
export type PinInput = z.input<typeof PinsSchema>['pins'][number];

/**
 * Sets all pins of one photo on one draft, numbered in the order given; none takes them off.
 * Throws NotAllowed, NotFound, Conflict once the entry is sealed, Invalid with a sentence per field.
 */
export async function setPins(
  viewer: Viewer,
  input: { caseNumber: string; entryId: string; photoId: string; pins: PinInput[] },
): Promise<void> {
  demand(viewer, 'add photos and notes');
  const staff = staffOnly(viewer);
  const { caseNumber, entryId, photoId } = input;
  const { pins } = parseInput(PinsSchema, { pins: input.pins });
  await transaction(async (tx) => {
    const { id: caseId } = await lockCase(tx, caseNumber);
    await lockDraft(tx, staff, { caseId, entryId });
    const [link] = await select<{ id: string }>(
      'SELECT id FROM entry_photos WHERE entry_id = ? AND photo_id = ?',
      [entryId, photoId],
      tx,
    );
    if (!link) throw new NotFound('No such photo is on this entry. Open the entry again.');
    await run('DELETE FROM pins WHERE entry_photo_id = ?', [link.id], tx);
    await Pin.bulkCreate(
      pins.map((pin, index) => ({ ...pin, id: v7(), entryPhotoId: link.id, number: index + 1 })),
      { transaction: tx },
    );
    await touchCase(tx, caseId);
  });
}
