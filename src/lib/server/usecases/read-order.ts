import type { OrderView, PreparationView } from '../../orders/views';
import { database } from '../db';
import { AppError } from '../errors';
import { findOrder } from '../orders/find-order';
import { loadOrder } from '../orders/load-order';
import { orderView } from '../orders/order-view';
import type { Person } from '../person';

/** One order as the person may see it. */
export async function readOrder(person: Person, number: string): Promise<OrderView> {
  const row = await findOrder(database(), person, number);
  return orderView(await loadOrder(database(), row), person.role);
}

/** One preparation of it; a customer sees the one whose proof was sent. */
export async function readPreparation(person: Person, number: string, id: number): Promise<PreparationView> {
  const order = await readOrder(person, number);
  const preparation = order.preparations.find((view) => view.id === id);
  if (!preparation) throw new AppError('not-found');
  return preparation;
}
