import { dress, type Mail } from '../letter';
import { orderPlate, orderUrl, type AboutOrder } from './about-order';

/** Tells the customer that a proof waits; `words` are the designer's own. */
export function proofReadyMail(order: AboutOrder & { words: string }): Mail {
  return dress('proof-ready', {
    subject: `Proof ready: order ${order.orderNumber}`,
    greeting: order.name,
    plate: orderPlate(order, 'Proof'),
    sentence: 'Your proof is ready: look at it at true size, then approve it or ask for changes.',
    paragraphs: [...(order.words ? [order.words] : []), 'We burn nothing until you have approved.'],
    action: { label: 'See the proof', url: orderUrl(order) },
    margin: 'Wood is grown, not made: the shade may differ a little from piece to piece.',
  });
}
