import type { OrderView } from '../../orders/views';
import { onHoldMail } from '../mail/messages/on-hold';
import { queueMail } from '../mail/queue-mail';
import { aboutOrder } from '../orders/mail-about';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Puts an order on hold, for a reason that the customer is told. */
export async function holdOrder(
  person: Person,
  number: string,
  version: number,
  reason: string,
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'hold', version }, (held) => ({
    change: { former_state: held.row.state, held_because: reason },
    words: reason,
    also: (trx, order) =>
      queueMail(trx, order.customer.email, onHoldMail({ ...aboutOrder(order, order.customer), reason })),
  }));
}
