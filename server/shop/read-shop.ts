import { NotFound } from '#domain/errors.ts';
import { Shop } from '#server/db/models/shop.ts';
import { database } from '#server/db/connection.ts';

/** What every page may know of the shop: nothing of it is private. */
export interface ShopProfile {
  name: string;
  place: string;
  address: string;
  telephone: string;
  email: string;
  /** ISO 4217 */
  currency: string;
  /** IANA name; every date is shown in it. */
  timeZone: string;
}

/** Reads the shop's profile. Throws NotFound while the shop was not set up. */
export async function readShop(): Promise<ShopProfile> {
  database();
  const shop = await Shop.findByPk(1, {
    attributes: ['name', 'place', 'address', 'telephone', 'email', 'currency', 'timeZone'],
    raw: true,
  });
  if (!shop) throw new NotFound('The shop is not set up yet. Enter its name and address first.');
  return shop;
}
