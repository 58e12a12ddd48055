import { v7 } from 'uuid';
import type { CustomerViewer, PublicViewer, StaffViewer } from '#domain/viewer.ts';
import { AuditRecord } from '../db/models/audit-record.ts';
import type { Transaction } from '../db/sql.ts';

/** Who acted: a viewer, or as much of one as a sign-in knows. */
export type Actor =
  | Pick<StaffViewer, 'kind' | 'personId'>
  | Pick<CustomerViewer, 'kind' | 'customerId'>
  | PublicViewer;

export interface Act {
  /** A short verb in the shop's words: "signed in", "took in". */
  act: string;
  caseId?: string | null;
  /** The id of what was acted on. */
  subjectId?: string | null;
  /** No personal data. */
  detail?: string | null;
}

/** Writes one act into the audit record, in the transaction of the act. */
export async function recordAct(
  tx: Transaction,
  actor: Actor,
  { act, caseId = null, subjectId = null, detail = null }: Act,
  { now = new Date() } = {},
): Promise<void> {
  await AuditRecord.create(
    {
      id: v7(),
      at: now,
      personId: actor.kind === 'staff' ? actor.personId : null,
      customerId: actor.kind === 'customer' ? actor.customerId : null,
      act,
      caseId,
      subjectId,
      detail,
    },
    { transaction: tx },
  );
}
