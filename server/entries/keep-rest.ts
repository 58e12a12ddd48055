import { v7 } from 'uuid';
import type { RestDraft } from '#domain/entry-draft.ts';
import { restFacts } from '#domain/rest-times.ts';
import { Rest } from '#server/db/models/rest.ts';
import type { Transaction } from '#server/db/sql.ts';

/** The rest that an entry begins, or null for none. */
export interface RestToKeep {
  caseId: string;
  entryId: string;
  startedAt: Date;
  rest: RestDraft | null;
}

/** Writes the rest of a draft as instants, in place of any it had. */
export async function keepRest(
  tx: Transaction,
  { caseId, entryId, startedAt, rest }: RestToKeep,
): Promise<void> {
  await Rest.destroy({ where: { entryId }, transaction: tx });
  if (rest === null) return;
  await Rest.create(
    { id: v7(), caseId, entryId, product: rest.product, ...restFacts(startedAt, rest) },
    { transaction: tx },
  );
}
