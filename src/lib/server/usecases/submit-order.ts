import { holdOnSubmit } from '../../orders/rules';
import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { onHoldMail } from '../mail/messages/on-hold';
import { queueMail } from '../mail/queue-mail';
import { aboutOrder } from '../orders/mail-about';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Submits an order with the rights statement; a customer's own blank that nobody has identified goes on hold at once. */
export async function submitOrder(person: Person, number: string, version: number): Promise<OrderView> {
  return moveOrder(person, number, { event: 'submit', version }, (_, facts) => {
    const now = new Date().toISOString();
    const held = holdOnSubmit(facts);
    const hold =
      held === null
        ? {}
        : { state: 'on-hold' as const, former_state: 'submitted' as const, held_because: held };
    return {
      change: { submitted_at: now, rights_confirmed_at: now, rights_confirmed_by: person.id, ...hold },
      words: 'The rights statement is confirmed.',
      also: async (trx, order) => {
        if (held === null) return;
        await audit(trx, {
          by: null,
          event: 'hold',
          subject: number,
          from: 'submitted',
          to: 'on-hold',
          words: held,
        });
        await queueMail(
          trx,
          order.customer.email,
          onHoldMail({ ...aboutOrder(order, order.customer), reason: held }),
        );
      },
    };
  });
}
