import type { OrderView } from '../../orders/views';
import { finishedMail } from '../mail/messages/finished';
import { queueMail } from '../mail/queue-mail';
import { aboutOrder } from '../orders/mail-about';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';
import { insertOutcome } from '../tables/outcomes';

/** Records how an order came out, and tells the customer that it is finished. */
export async function finishOrder(
  person: Person,
  number: string,
  version: number,
  outcome: { words: string; measuredLstar: number | null },
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'done', version }, () => ({
    words: outcome.words,
    also: async (trx, order) => {
      const { words, measuredLstar } = outcome;
      await insertOutcome(trx, {
        order_id: order.row.id,
        recorded_by: person.id,
        kind: 'done',
        words,
        measured_lstar: measuredLstar,
        new_blank: '',
        cost: '',
      });
      await queueMail(
        trx,
        order.customer.email,
        finishedMail({ ...aboutOrder(order, order.customer), quantity: order.fields.quantity }),
      );
    },
  }));
}
