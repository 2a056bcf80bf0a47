import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** A designer takes a submitted order into work. */
export async function takeOrder(person: Person, number: string, version: number): Promise<OrderView> {
  return moveOrder(person, number, { event: 'take', version }, () => ({ change: { taken_by: person.id } }));
}
