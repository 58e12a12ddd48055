import type { Role } from '#domain/viewer.ts';
import { select, type Transaction } from '#server/db/sql.ts';
import type { Person } from '#server/record/person-in-record.ts';

/** The person who issued a warranty, for whom the job goes on. */
export async function issuerOf(issuedBy: string, tx?: Transaction): Promise<Person> {
  const [row] = await select<{ name: string; role: Role; number: number }>(
    'SELECT name, role, number FROM people WHERE id = ?',
    [issuedBy],
    tx,
  );
  if (!row) throw new Error('A warranty was issued by one of the shop’s people.');
  return { personId: issuedBy, ...row };
}
