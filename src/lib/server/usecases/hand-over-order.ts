import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Records that a finished order left the shop. */
export async function handOverOrder(
  person: Person,
  number: string,
  version: number,
  leaving: { how: 'collected' | 'sent'; byWhom: string },
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'hand-over', version }, () => ({
    words: `${leaving.how} by ${leaving.byWhom}`,
  }));
}
