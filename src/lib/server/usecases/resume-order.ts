import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Takes an order from hold back to where it stood. */
export async function resumeOrder(person: Person, number: string, version: number): Promise<OrderView> {
  return moveOrder(person, number, { event: 'resume', version }, () => ({}));
}
