import type { PartName } from '#evidence/seal/kinds.ts';
import { select, type Transaction } from '#server/db/sql.ts';

interface Row {
  part: 'owner' | 'bringer' | 'payer';
  name: string;
  same_as_owner: 0 | 1;
  complaint: string;
}

/**
 * The people of a case as parts of its first entry: the owner with the complaint in their own words,
 * and the bringer and the payer where they are other people. Each can be erased alone.
 * @returns nothing when `entryId` is not the entry the case was taken in with
 */
export async function partyParts(
  tx: Transaction,
  caseId: string,
  entryId: string,
): Promise<Partial<Record<PartName, object>>> {
  const rows = await select<Row>(
    `SELECT p.part, c.name, k.complaint,
            p.part <> 'owner' AND p.customer_id = o.customer_id AS same_as_owner
     FROM parties p
     JOIN customers c ON c.id = p.customer_id
     JOIN cases k ON k.id = p.case_id
     LEFT JOIN parties o ON o.case_id = p.case_id AND o.part = 'owner'
     WHERE p.case_id = ? AND ? = (SELECT MIN(e.id) FROM entries e WHERE e.case_id = p.case_id)`,
    [caseId, entryId],
    tx,
  );
  return Object.fromEntries(
    rows
      .filter((row) => !row.same_as_owner)
      .map(({ part, name, complaint }) => [
        part,
        { v: 1, name, text: part === 'owner' ? complaint : null },
      ]),
  );
}
