import { orderNumber } from '../../orders/number';
import { orderFieldsSchema, type OrderFields, type OrderPatch } from '../../orders/order';
import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite } from '../db';
import { AppError } from '../errors';
import { viewAfter } from '../orders/move-order';
import { requireKnownStock } from '../orders/require-known-stock';
import { isStaff, type Person } from '../person';
import { insertOrder } from '../tables/orders';
import { personById } from '../tables/people';

const EMPTY: OrderFields = {
  title: '',
  quantity: 1,
  dueOn: null,
  widthMm: null,
  heightMm: null,
  blank: null,
  placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns: 0, fixture: '' },
  treatment: null,
  shadeLstar: null,
  route: 'bare-burn',
  use: 'decoration',
  notes: '',
  withoutProof: false,
};

/** Opens a draft: for oneself as a customer, for a named customer as staff. */
export async function openOrder(person: Person, patch: OrderPatch, customerId?: number): Promise<OrderView> {
  if (isStaff(person) && customerId === undefined) {
    throw new AppError('malformed', { fields: { customerId: 'Say which customer the order is for.' } });
  }
  const forId = isStaff(person) ? (customerId as number) : person.id;
  return withWrite(async (trx) => {
    const customer = await personById(trx, forId);
    if (customer?.role !== 'customer')
      throw new AppError('malformed', { fields: { customerId: 'There is no such customer.' } });
    const fields = orderFieldsSchema.parse({ ...EMPTY, ...patch });
    await requireKnownStock(trx, fields);
    const id = await insertOrder(trx, customer.id, person.id, fields);
    await audit(trx, {
      by: person,
      event: 'open',
      subject: orderNumber(id),
      to: 'draft',
      words: isStaff(person) ? `for ${customer.name}` : '',
    });
    return viewAfter(trx, id, person);
  });
}
