import { select } from '../db/sql.ts';
import type { Sender } from './letter.ts';

/** The shop as its mails are signed. Throws when the shop has no row yet. */
export async function readSender(): Promise<Sender> {
  const [shop] = await select<Sender>('SELECT name, address, telephone FROM shops WHERE id = 1');
  if (shop === undefined) throw new Error('The shop has no name yet: load its row first.');
  return shop;
}
