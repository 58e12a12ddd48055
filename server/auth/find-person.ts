import { NotAllowed } from '#domain/errors.ts';
import { select } from '../db/sql.ts';

const UNKNOWN =
  'You are signed in with the shop’s account, but you are not on this shop’s list of people. Ask the shop owner to add you.';

/** The id of the person with this subject at the identity provider. Throws NotAllowed for others. */
export async function findPerson(subject: string): Promise<string> {
  const [person] = await select<{ id: string }>(
    'SELECT id FROM people WHERE subject = ? AND removed_at IS NULL',
    [subject],
  );
  if (person === undefined) throw new NotAllowed(UNKNOWN);
  return person.id;
}
