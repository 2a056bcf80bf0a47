import { orderIdOf } from '../../orders/number';
import type { Db } from '../db';
import { AppError } from '../errors';
import { isStaff, type Person } from '../person';
import { orderById, type OrderRow } from '../tables/orders';

/** The order of a number, if the person may see it; another customer's order is as if it did not exist. */
export async function findOrder(db: Db, person: Person, number: string): Promise<OrderRow> {
  const id = orderIdOf(number);
  const row = id === null ? undefined : await orderById(db, id);
  if (!row || (!isStaff(person) && row.customer_id !== person.id)) throw new AppError('not-found');
  return row;
}

/** The same, for a change: refuses when another tab or person has changed it since. */
export async function findUnchangedOrder(
  db: Db,
  person: Person,
  number: string,
  version: number,
): Promise<OrderRow> {
  const row = await findOrder(db, person, number);
  if (row.version !== version) throw new AppError('conflict');
  return row;
}
