import { dress, type Mail } from '../letter';
import { orderPlate, orderUrl, type AboutOrder } from './about-order';

/** Tells the customer that the piece is engraved. */
export function finishedMail(order: AboutOrder & { quantity: number }): Mail {
  const pieces = order.quantity === 1 ? 'Your piece is' : `Your ${order.quantity} pieces are`;
  return dress('finished', {
    subject: `Finished: order ${order.orderNumber}`,
    greeting: order.name,
    plate: orderPlate(order, 'Finished'),
    sentence: `${pieces} engraved and ready to be collected or sent.`,
    paragraphs: ['We will be in touch about handing over, unless that is settled already.'],
    action: { label: 'See the order', url: orderUrl(order) },
    margin: 'Freshly burned wood smells of smoke for a day or two; let it air.',
  });
}
