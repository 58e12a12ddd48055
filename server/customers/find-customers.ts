import { demand } from '#domain/rights.ts';
import type { Viewer } from '#domain/viewer.ts';
import { contains } from '#server/db/like.ts';
import { select } from '#server/db/sql.ts';

/** A customer as found at the counter. */
export interface FoundCustomer {
  id: string;
  name: string;
  email: string | null;
  telephone: string | null;
}

/** The most that are listed; with more, the search is to be narrowed. */
export const MOST_FOUND = 10;

const digits = (text: string) => text.replace(/\D/g, '');

/**
 * Finds customers by a part of their name or e-mail address, or by at least four digits of their
 * telephone number, however it is spaced. Nothing for fewer than two characters.
 */
export async function findCustomers(
  viewer: Viewer,
  { words }: { words: string },
): Promise<FoundCustomer[]> {
  demand(viewer, 'take in');
  const text = words.trim();
  if (text.length < 2) return [];
  const number = digits(text);
  return select<FoundCustomer>(
    `SELECT id, name, email, telephone FROM customers
     WHERE erased_at IS NULL
       AND (name LIKE :like OR email LIKE :like
            OR (:number <> '' AND REGEXP_REPLACE(telephone, '[^0-9]', '') LIKE :number))
     ORDER BY name, id LIMIT ${MOST_FOUND}`,
    { like: contains(text), number: number.length >= 4 ? contains(number) : '' },
  );
}
