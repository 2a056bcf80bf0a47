import { dress, type Mail } from '../letter';
import { orderPlate, orderUrl, type AboutOrder } from './about-order';

/** Tells the customer that the order waits, and why. */
export function onHoldMail(order: AboutOrder & { reason: string }): Mail {
  return dress('on-hold', {
    subject: `On hold: order ${order.orderNumber}`,
    greeting: order.name,
    plate: orderPlate(order, 'On hold'),
    sentence: 'Your order waits for now.',
    paragraphs: [order.reason],
    action: { label: 'Open the order', url: orderUrl(order) },
    margin: 'It goes on from where it stood as soon as this is settled.',
  });
}
