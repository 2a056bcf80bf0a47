import type { StockView } from '../../orders/views';
import { stockSchema, type Stock } from '../../stock/stock';
import { audit } from '../audit';
import { refuseOn } from '../constraint';
import { withWrite, type Transaction } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { insertStock, stockById, updateStock } from '../tables/stocks';
import { readWash } from '../tables/shop-washes';

async function requireStock(trx: Transaction, id: number): Promise<StockView> {
  const stock = await stockById(trx, id);
  if (!stock) throw new AppError('not-found');
  return stock;
}

/** The wash is offered only with the shop's own product and its safety data sheet. */
async function requireWashFor(trx: Transaction, stock: Stock): Promise<void> {
  if (stock.routes.includes('darkening-wash') && !(await readWash(trx)))
    throw new AppError('wash-without-sheet');
}

export async function addStock(by: Person, stock: Stock): Promise<StockView> {
  return withWrite(async (trx) => {
    await requireWashFor(trx, stock);
    const id = await refuseOn('SQLITE_CONSTRAINT_UNIQUE', 'name-taken', () => insertStock(trx, stock));
    await audit(trx, { by, event: 'add-stock', subject: `stock ${id}`, words: stock.name });
    return requireStock(trx, id);
  });
}

/** Changes a stock, or takes it off the list; submit and release look at it as it then is. */
export async function changeStock(
  by: Person,
  id: number,
  change: Partial<Stock> & { retired?: boolean },
): Promise<StockView> {
  return withWrite(async (trx) => {
    const before = await requireStock(trx, id);
    const { retired = before.retired, ...changed } = { ...before, ...change };
    const stock = stockSchema.parse(changed);
    await requireWashFor(trx, stock);
    await refuseOn('SQLITE_CONSTRAINT_UNIQUE', 'name-taken', () =>
      updateStock(trx, id, stock, retired ? new Date().toISOString() : null),
    );
    const event = retired === before.retired ? 'change-stock' : retired ? 'retire-stock' : 'bring-stock-back';
    await audit(trx, {
      by,
      event,
      subject: `stock ${id}`,
      words: `${stock.name}: ${Object.keys(change).join(', ')}`,
    });
    return requireStock(trx, id);
  });
}
