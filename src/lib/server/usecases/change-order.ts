import { asksForCheck, changeRefusal } from '../../orders/changes';
import { orderFieldsSchema, type OrderPatch } from '../../orders/order';
import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite } from '../db';
import { AppError } from '../errors';
import { askForCheck } from '../orders/ask-for-check';
import { findUnchangedOrder } from '../orders/find-order';
import { viewAfter } from '../orders/move-order';
import { requireKnownStock } from '../orders/require-known-stock';
import type { Person } from '../person';
import { changeOrder, fieldColumns, fieldsOf } from '../tables/orders';

/** Changes what an order says; a new size, blank, placement or treatment has the artwork checked again. */
export async function changeOrderFields(
  person: Person,
  number: string,
  version: number,
  patch: OrderPatch,
): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findUnchangedOrder(trx, person, number, version);
    const refusal = changeRefusal(patch, row.state, row.former_state, person.role);
    if (refusal !== null) throw new AppError('not-now', { detail: refusal });
    const before = fieldsOf(row);
    const after = orderFieldsSchema.parse({ ...before, ...patch });
    await requireKnownStock(trx, after, before);
    if (!(await changeOrder(trx, row, fieldColumns(after)))) throw new AppError('conflict');
    if (row.state !== 'draft') {
      const changed = (Object.keys(patch) as (keyof OrderPatch)[]).filter(
        (key) => JSON.stringify(before[key]) !== JSON.stringify(after[key]),
      );
      await audit(trx, { by: person, event: 'change', subject: number, words: changed.join(', ') });
    }
    if (asksForCheck(before, after)) await askForCheck(trx, row.id, 'settled');
    return viewAfter(trx, row.id, person);
  });
}
