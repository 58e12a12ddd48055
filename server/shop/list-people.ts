import { demand } from '#domain/rights.ts';
import type { Role, Viewer } from '#domain/viewer.ts';
import { select } from '#server/db/sql.ts';

/** Someone of the shop, as staff see them. */
export interface ShopPerson {
  id: string;
  name: string;
  role: Role;
}

/** The people of the shop who may be given work: everyone who has not left, in the order they came. */
export async function listPeople(viewer: Viewer): Promise<ShopPerson[]> {
  demand(viewer, 'see cases');
  return select<ShopPerson>(
    'SELECT id, name, role FROM people WHERE removed_at IS NULL ORDER BY number',
  );
}
