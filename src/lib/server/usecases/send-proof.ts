import type { OrderView } from '../../orders/views';
import { proofReadyMail } from '../mail/messages/proof-ready';
import { queueMail } from '../mail/queue-mail';
import { aboutOrder } from '../orders/mail-about';
import { moveOrder } from '../orders/move-order';
import type { Person } from '../person';

/** Sends the proof of what was passed: the customer may look at it from now on, and is told by mail. */
export async function sendProof(
  person: Person,
  number: string,
  version: number,
  words: string,
): Promise<OrderView> {
  return moveOrder(person, number, { event: 'send-proof', version }, () => ({
    words,
    also: (trx, order) =>
      queueMail(trx, order.customer.email, proofReadyMail({ ...aboutOrder(order, order.customer), words })),
  }));
}
