import { dress, type Mail } from '../letter';
import { orderPlate, orderUrl, type AboutOrder } from './about-order';

/** Confirms to the customer what was approved, by whom and how. */
export function approvedMail(
  order: AboutOrder & { approvedBy: string; how: string; manifestSha256: string },
): Mail {
  return dress('approved', {
    subject: `Approved: order ${order.orderNumber}`,
    greeting: order.name,
    plate: orderPlate(order, 'Approval'),
    sentence: `${order.approvedBy} has approved the proof${order.how ? ` (${order.how})` : ''}; it goes to the workshop next.`,
    paragraphs: ['From now on a change needs a new proof. Write to us at once if this is not right.'],
    action: { label: 'Follow the order', url: orderUrl(order) },
    margin: `The approval is for exactly these files: ${order.manifestSha256.slice(0, 16)}.`,
  });
}
