import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Takes a released order back from the operators. */
export async function recallOrder(
  person: Person,
  number: string,
  version: number,
  reason: string,
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'recall', version }, () => ({ words: reason }));
}
