import type { OrderFields } from '../../orders/order';
import type { Db } from '../db';
import { AppError } from '../errors';
import { stockById } from '../tables/stocks';

/** Refuses a stock that the shop does not have, or has no more. */
export async function requireKnownStock(db: Db, fields: OrderFields, before?: OrderFields): Promise<void> {
  const id = fields.blank?.stockId ?? null;
  if (id === null || id === before?.blank?.stockId) return;
  const stock = await stockById(db, id);
  if (!stock || stock.retired)
    throw new AppError('malformed', {
      fields: { 'blank.stockId': 'The shop has no such stock. Choose another.' },
    });
}
