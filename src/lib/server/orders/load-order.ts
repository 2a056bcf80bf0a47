import { orderNumber } from '../../orders/number';
import type { OrderFields } from '../../orders/order';
import { settingsFor } from '../../orders/settings';
import type { Design, MachineView, StockView } from '../../orders/views';
import type { Settings } from '../../prepare/settings';
import type { Db } from '../db';
import { artworksOfOrder } from '../tables/artworks';
import { machineById } from '../tables/machines';
import { designOf, fieldsOf, type OrderRow } from '../tables/orders';
import { outcomesOfOrder } from '../tables/outcomes';
import { personById, type PersonRow } from '../tables/people';
import { preparationsOfOrder, preparedFilesOfOrder } from '../tables/preparations';
import { recordOf } from '../tables/record';
import { readWash } from '../tables/shop-washes';
import { stockById } from '../tables/stocks';
import { tasksOfOrder } from '../tables/tasks';
import { waiversOfOrder } from '../tables/waivers';

/** An order with everything that hangs on it, as the database has it. */
export interface LoadedOrder {
  row: OrderRow;
  number: string;
  fields: OrderFields;
  design: Design | null;
  customer: PersonRow;
  stock: StockView | null;
  machine: MachineView | null;
  washOffered: boolean;
  artworks: Awaited<ReturnType<typeof artworksOfOrder>>;
  preparations: Awaited<ReturnType<typeof preparationsOfOrder>>;
  files: Awaited<ReturnType<typeof preparedFilesOfOrder>>;
  tasks: Awaited<ReturnType<typeof tasksOfOrder>>;
  waivers: Awaited<ReturnType<typeof waiversOfOrder>>;
  outcomes: Awaited<ReturnType<typeof outcomesOfOrder>>;
  record: Awaited<ReturnType<typeof recordOf>>;
}

/** Reads one order whole; `db` may be the transaction that has just changed it. */
export async function loadOrder(db: Db, row: OrderRow): Promise<LoadedOrder> {
  const design = designOf(row);
  const fields = fieldsOf(row);
  // Before what the tasks write: a task that is read as done has its result in what is read after it.
  const tasks = await tasksOfOrder(db, row.id);
  const customer = await personById(db, row.customer_id);
  if (!customer) throw new Error(`expected the customer of order ${row.id}, got none`);
  return {
    row,
    number: orderNumber(row.id),
    fields,
    design,
    customer,
    stock: row.stock_id === null ? null : ((await stockById(db, row.stock_id)) ?? null),
    machine: design ? ((await machineById(db, design.machineId)) ?? null) : null,
    washOffered: (await readWash(db)) !== null,
    artworks: await artworksOfOrder(db, row.id),
    preparations: await preparationsOfOrder(db, row.id),
    files: await preparedFilesOfOrder(db, row.id),
    tasks,
    waivers: await waiversOfOrder(db, row.id),
    outcomes: await outcomesOfOrder(db, row.id),
    record: await recordOf(db, orderNumber(row.id)),
  };
}

/** Settings that a preparation would have now; null while size, design or machine are missing. */
export function currentSettings(
  order: Pick<LoadedOrder, 'row' | 'number' | 'fields' | 'design' | 'machine' | 'stock'>,
): Settings | null {
  const { row, number, fields, design, machine, stock } = order;
  const spot = machine?.spotPresets.find(({ id }) => id === design?.spotPresetId);
  if (!design || !machine || !spot || fields.widthMm === null || fields.heightMm === null) return null;
  return settingsFor({ number, fields, design, machine, spot, stock, typedBy: row.recipe_typed_by });
}
