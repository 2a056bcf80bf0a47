import type { AboutOrder } from '../mail/messages/about-order';
import type { PersonRow } from '../tables/people';
import type { LoadedOrder } from './load-order';

/** What a mail about an order names, for whoever reads it. */
export function aboutOrder(
  order: Pick<LoadedOrder, 'number' | 'fields'>,
  reader: Pick<PersonRow, 'name'>,
): AboutOrder {
  return { name: reader.name, orderNumber: order.number, title: order.fields.title };
}
