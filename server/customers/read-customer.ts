import { NotFound } from '#domain/errors.ts';
import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';
import type { FoundCustomer } from './find-customers.ts';

/** Reads one customer for the counter. Throws NotFound for an unknown or erased one. */
export async function readCustomer(viewer: Viewer, { id }: { id: string }): Promise<FoundCustomer> {
  demand(viewer, 'take in');
  const [customer] = await select<FoundCustomer>(
    'SELECT id, name, email, telephone FROM customers WHERE id = ? AND erased_at IS NULL',
    [id],
  );
  if (!customer) throw new NotFound('This customer is not on record. Search by name again.');
  return customer;
}
