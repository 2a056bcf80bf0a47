import { siteUrl } from '../address';

/** What every mail about an order names. */
export interface AboutOrder {
  /** name of whoever reads it, or empty */
  name: string;
  orderNumber: string;
  title: string;
}

export const orderUrl = (order: AboutOrder): string => siteUrl(`/orders/${order.orderNumber}`);
export const workUrl = (order: AboutOrder): string => siteUrl(`/queue/${order.orderNumber}`);
export const orderPlate = (order: AboutOrder, line: string): { title: string; line: string } => ({
  title: order.title ? `${order.orderNumber} ${order.title}` : order.orderNumber,
  line,
});
