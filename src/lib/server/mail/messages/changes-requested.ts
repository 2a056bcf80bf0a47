import { dress, type Mail } from '../letter';
import { orderPlate, workUrl, type AboutOrder } from './about-order';

/** Tells the designer what the customer wants changed. */
export function changesRequestedMail(order: AboutOrder & { customer: string; words: string }): Mail {
  return dress('changes-requested', {
    subject: `Changes asked for: order ${order.orderNumber}`,
    greeting: order.name,
    plate: orderPlate(order, `Proof answered by ${order.customer}`),
    sentence: `${order.customer} asks for changes.`,
    paragraphs: [order.words],
    action: { label: 'Open the order', url: workUrl(order) },
    margin: 'The pass no longer holds; the order is in preparation again.',
  });
}
