import type { Wash } from '../../stock/wash';
import { audit } from '../audit';
import { database, withWrite } from '../db';
import type { Person } from '../person';
import { readWash, writeWash } from '../tables/shop-washes';

export const findWash = (): Promise<Wash | null> => readWash(database());

/** Enters the shop's darkening wash; from then on stocks can offer the route. */
export async function enterWash(by: Person, wash: Wash): Promise<Wash> {
  await withWrite(async (trx) => {
    await writeWash(trx, wash, new Date().toISOString());
    await audit(trx, { by, event: 'enter-wash', subject: 'wash', words: `${wash.product}, ${wash.ratio}` });
  });
  return wash;
}
