import type { OrderView } from '../../orders/views';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';
import { insertOutcome } from '../tables/outcomes';

/** Records a spoiled piece: why, which blank takes its place, and what it cost; the order waits for the machine again. */
export async function recordSpoiled(
  person: Person,
  number: string,
  version: number,
  outcome: { reason: string; newBlank: string; cost: string },
): Promise<OrderView> {
  const { reason, newBlank, cost } = outcome;
  return moveOrder(person, number, { event: 'spoiled', version }, () => ({
    words: `${reason} New blank: ${newBlank}`,
    also: (trx, order) =>
      insertOutcome(trx, {
        order_id: order.row.id,
        recorded_by: person.id,
        kind: 'spoiled',
        words: reason,
        measured_lstar: null,
        new_blank: newBlank,
        cost,
      }),
  }));
}
