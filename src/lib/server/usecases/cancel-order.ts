import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Cancels an order, for a reason. */
export async function cancelOrder(
  person: Person,
  number: string,
  version: number,
  reason: string,
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'cancel', version }, () => ({ words: reason }));
}
