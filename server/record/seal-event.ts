import { v7 } from 'uuid';
import type { CaseKind, PartName } from '#evidence/seal/kinds.ts';
import { touchCase } from '#server/cases/touch-case.ts';
import { run, type Transaction } from '#server/db/sql.ts';
import { appendEntry, type Appended } from '#server/evidence/append-entry.ts';
import type { Person } from './person-in-record.ts';

/** Something that happened to a case and is sealed at once, without a draft. */
export interface NewEvent {
  caseId: string;
  /** The case's record id, 16 bytes. */
  record: Buffer;
  kind: CaseKind;
  phase: 'before' | 'during' | 'after';
  shown: object;
  parts?: Partial<Record<PartName, object>>;
  /** C of the entries it names. */
  names: Buffer[];
  /** Whoever did it; null when a job did. */
  by: Person | null;
  now: Date;
}

/** Seals an event of a case, with a row on its timeline. The case's row is locked by the caller. */
export async function sealEvent(tx: Transaction, event: NewEvent): Promise<Appended> {
  const { caseId, record, kind, phase, shown, parts = {}, names, by, now } = event;
  const appended = await appendEntry(tx, {
    chain: record,
    kind,
    visibility: 'shared',
    occurredAt: null,
    parts: { shown, ...parts },
    photos: [],
    names,
    now,
  });
  await run(
    `INSERT INTO entries (id, case_id, kind, phase, visibility, written_by, written_at, edited_at,
                          leaf_index, sealed_at, sealed_by)
     VALUES (:id, :caseId, :kind, :phase, 'shared', :by, :at, :at, :leaf, :at, :by)`,
    {
      id: v7(),
      caseId,
      kind,
      phase,
      by: by?.personId ?? null,
      at: appended.recordedAt,
      leaf: appended.leafIndex,
    },
    tx,
  );
  await touchCase(tx, caseId);
  return appended;
}
