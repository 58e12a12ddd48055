import { z } from 'zod';
import { Conflict, Invalid } from '#domain/errors.ts';
import { optionalText, parseInput } from '#domain/input.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { run, select, transaction } from '#server/db/sql.ts';
import { lockCase } from '#server/record/lock-case.ts';
import { touchCase } from './touch-case.ts';

/** What is next on a case, who has it and where it hangs. */
export const NextStepSchema = z.object({
  nextStep: optionalText('What is next', 160),
  technicianId: z
    .union([z.literal('').transform(() => null), z.null(), z.uuid()], {
      error: 'This person is not in the shop any more. Choose another.',
    })
    .optional()
    .default(null),
  place: optionalText('Where it hangs', 80),
});

/** Sets what is next. Throws Invalid with a sentence per field, Conflict when the case is closed. */
export async function setNextStep(
  viewer: Viewer,
  { caseNumber, ...input }: { caseNumber: string } & Record<string, unknown>,
): Promise<void> {
  demand(viewer, 'take in');
  const { nextStep, technicianId, place } = parseInput(NextStepSchema, input);
  await transaction(async (tx) => {
    const { id, closedAt } = await lockCase(tx, caseNumber);
    if (closedAt) throw new Conflict('The case is closed. Nothing is next on it but hand-back.');
    if (technicianId !== null) {
      const found = await select(
        'SELECT id FROM people WHERE id = ? AND removed_at IS NULL',
        [technicianId],
        tx,
      );
      if (found.length === 0)
        throw new Invalid({
          technicianId: 'This person is not in the shop any more. Choose another.',
        });
    }
    await run(
      'UPDATE cases SET next_step = ?, technician_id = ?, place = ? WHERE id = ?',
      [nextStep, technicianId, place, id],
      tx,
    );
    await touchCase(tx, id);
  });
}
