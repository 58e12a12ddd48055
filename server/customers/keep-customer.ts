import { v7 } from 'uuid';
import { Invalid } from '#domain/errors.ts';
import type { NewCustomer } from '#domain/intake.ts';
import { Customer } from '#server/db/models/customer.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** A customer as a mail needs them. */
export interface KeptCustomer {
  id: string;
  name: string;
  email: string | null;
}

type Choice = { id: string } | NewCustomer;

const known = (choice: Choice): choice is { id: string } => Boolean(choice.id);

async function byId(tx: Transaction, id: string, field: string): Promise<KeptCustomer> {
  const [customer] = await select<KeptCustomer>(
    'SELECT id, name, email FROM customers WHERE id = ? AND erased_at IS NULL',
    [id],
    tx,
  );
  if (customer) return customer;
  throw new Invalid({ [field]: 'This customer is not on record any more. Search again.' });
}

const sameName = (a: string, b: string) => a.localeCompare(b, 'en', { sensitivity: 'base' }) === 0;

/**
 * The customer that was chosen, or found by e-mail address and name, or a new one; in the transaction
 * of the taking in. One address is one person, because it is what they sign in with: with another name
 * it is refused. `field` names the part of the form the sentences belong to ("owner").
 */
export async function keepCustomer(
  tx: Transaction,
  choice: Choice,
  { field, now }: { field: string; now: Date },
): Promise<KeptCustomer> {
  if (known(choice)) return byId(tx, choice.id, field);
  const { name, email, telephone, address, tellBy } = choice;
  if (email !== null) {
    const [found] = await select<KeptCustomer>(
      'SELECT id, name, email FROM customers WHERE email = ? AND erased_at IS NULL LIMIT 1',
      [email],
      tx,
    );
    if (found && sameName(found.name, name)) return found;
    if (found)
      throw new Invalid({
        [`${field}.email`]:
          'This address belongs to another customer here. Choose that customer, or give another address.',
      });
  }
  const id = v7();
  await Customer.create(
    { id, name, email, telephone, address, tellBy, createdAt: now },
    { transaction: tx },
  );
  return { id, name, email };
}
