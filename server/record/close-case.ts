import { Conflict } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { recordAct } from '#server/audit/record-act.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { chainOf } from './chain-of.ts';
import { lockCase, staffOnly, type LockedCase } from './lock-case.ts';
import { sealEvent } from './seal-event.ts';
import { staffPart, type Person } from './person-in-record.ts';
import { mailOwner } from './mail-owner.ts';

async function refuseOpenDrafts(tx: Transaction, caseId: string): Promise<void> {
  const drafts = await select<{ title: string | null }>(
    `SELECT JSON_VALUE(draft, '$.title') AS title FROM entries
     WHERE case_id = ? AND leaf_index IS NULL ORDER BY id`,
    [caseId],
    tx,
  );
  if (drafts.length === 0) return;
  const titles = drafts.map(({ title }) => `“${title ?? ''}”`).join(', ');
  throw new Conflict(
    drafts.length === 1
      ? `One entry is not sealed yet: ${titles}. Seal it or remove it, then close the case.`
      : `${drafts.length} entries are not sealed yet: ${titles}. Seal or remove them, then close the case.`,
  );
}

/** Seals a close: it lists every entry of the case so far, all kinds, and counts the photos. */
export async function sealClose(
  tx: Transaction,
  repair: LockedCase,
  by: Person,
  now: Date,
): Promise<{ commitment: Buffer; recordedAt: Date }> {
  const chain = await chainOf(tx, repair.record);
  const photos = chain.reduce((sum, { header }) => sum + header.photos.length, 0);
  return sealEvent(tx, {
    caseId: repair.id,
    record: repair.record,
    kind: 'close',
    phase: 'after',
    shown: { v: 1, text: 'The case is closed.', entries: chain.length, photos },
    parts: staffPart(by),
    names: chain.map(({ commitment }) => commitment),
    by,
    now,
  });
}

/**
 * Closes a case: the sealed event that ends it and lists all its entries. The owner is told that the
 * instrument is ready to go home.
 * @throws NotFound, NotAllowed by role; Conflict when it is closed already, has no entry, or drafts
 *   are open (the sentence names them)
 */
export async function closeCase(
  viewer: Viewer,
  { caseNumber }: { caseNumber: string },
  { now = new Date() }: { now?: Date } = {},
): Promise<void> {
  demand(viewer, 'close');
  const staff = staffOnly(viewer);
  await transaction(async (tx) => {
    const repair = await lockCase(tx, caseNumber);
    if (repair.closedAt) throw new Conflict('This case is closed already.');
    await refuseOpenDrafts(tx, repair.id);
    if ((await chainOf(tx, repair.record)).length === 0) {
      throw new Conflict('Nothing is sealed in this case. Seal at least one entry, then close it.');
    }
    const { recordedAt } = await sealClose(tx, repair, staff, now);
    const told = await mailOwner(tx, repair.id, `ready-to-go-home/${repair.id}`, (about) => ({
      template: 'ready-to-go-home',
      data: about,
    }));
    await run(
      'UPDATE cases SET closed_at = ?, owner_told_at = COALESCE(owner_told_at, ?) WHERE id = ?',
      [recordedAt, told ? recordedAt : null, repair.id],
      tx,
    );
    await recordAct(tx, staff, { act: 'closed the case', caseId: repair.id });
  });
}
