import { orderFieldsSchema, type OrderFields } from '../../orders/order';
import type { OrderState } from '../../orders/state';
import { designSchema, type Design } from '../../orders/views';
import type { Db } from '../db';

export interface OrderRow {
  id: number;
  customer_id: number;
  opened_by: number;
  state: OrderState;
  former_state: OrderState | null;
  version: number;
  created_at: string;
  updated_at: string;
  submitted_at: string | null;
  title: string;
  quantity: number;
  due_on: string | null;
  width_mm: number | null;
  height_mm: number | null;
  blank: string | null;
  stock_id: number | null;
  placement: string;
  treatment: string | null;
  shade_lstar: number | null;
  route: string;
  use: string;
  notes: string;
  without_proof: 0 | 1;
  rights_confirmed_at: string | null;
  rights_confirmed_by: number | null;
  taken_by: number | null;
  design: string | null;
  machine_id: number | null;
  spot_preset_id: number | null;
  recipe_typed_by: string;
  passed_at: string | null;
  passed_by: number | null;
  passed_preparation_id: number | null;
  passed_manifest_sha256: string | null;
  approved_at: string | null;
  approved_by: string | null;
  approved_how: string | null;
  approved_manifest_sha256: string | null;
  held_because: string;
}

/** What a change of an order writes; version and time are written by `changeOrder`. */
export type OrderChange = Partial<
  Omit<OrderRow, 'id' | 'version' | 'updated_at' | 'created_at' | 'customer_id' | 'opened_by'>
>;

type FieldColumns = Pick<
  OrderRow,
  | 'title'
  | 'quantity'
  | 'due_on'
  | 'width_mm'
  | 'height_mm'
  | 'blank'
  | 'stock_id'
  | 'placement'
  | 'treatment'
  | 'shade_lstar'
  | 'route'
  | 'use'
  | 'notes'
  | 'without_proof'
>;

/** The stock has a column of its own, so that the database keeps it from vanishing. */
export function fieldColumns(fields: OrderFields): FieldColumns {
  const { stockId = null, ...blank } = fields.blank ?? {};
  return {
    title: fields.title,
    quantity: fields.quantity,
    due_on: fields.dueOn,
    width_mm: fields.widthMm,
    height_mm: fields.heightMm,
    blank: fields.blank && JSON.stringify(blank),
    stock_id: stockId,
    placement: JSON.stringify(fields.placement),
    treatment: fields.treatment,
    shade_lstar: fields.shadeLstar,
    route: fields.route,
    use: fields.use,
    notes: fields.notes,
    without_proof: fields.withoutProof ? 1 : 0,
  };
}

export function fieldsOf(row: OrderRow): OrderFields {
  return orderFieldsSchema.parse({
    title: row.title,
    quantity: row.quantity,
    dueOn: row.due_on,
    widthMm: row.width_mm,
    heightMm: row.height_mm,
    blank: row.blank === null ? null : { ...JSON.parse(row.blank), stockId: row.stock_id },
    placement: JSON.parse(row.placement),
    treatment: row.treatment,
    shadeLstar: row.shade_lstar,
    route: row.route,
    use: row.use,
    notes: row.notes,
    withoutProof: row.without_proof === 1,
  });
}

export const designOf = (row: Pick<OrderRow, 'design'>): Design | null =>
  row.design === null ? null : designSchema.parse(JSON.parse(row.design));

export async function insertOrder(
  db: Db,
  customerId: number,
  openedBy: number,
  fields: OrderFields,
): Promise<number> {
  const at = new Date().toISOString();
  const [row] = await db('orders')
    .insert({
      customer_id: customerId,
      opened_by: openedBy,
      state: 'draft',
      created_at: at,
      updated_at: at,
      ...fieldColumns(fields),
    })
    .returning<{ id: number }[]>('id');
  return row.id;
}

export async function orderById(db: Db, id: number): Promise<OrderRow | undefined> {
  return db<OrderRow>('orders').where({ id }).first();
}

/** The one guarded update: nothing is written unless the order is still in the state and version that the caller saw. */
export async function changeOrder(
  db: Db,
  seen: Pick<OrderRow, 'id' | 'state' | 'version'>,
  change: OrderChange,
): Promise<boolean> {
  const changed = await db('orders')
    .where({ id: seen.id, state: seen.state, version: seen.version })
    .update({ ...change, version: seen.version + 1, updated_at: new Date().toISOString() });
  return changed === 1;
}

export async function orderTitles(db: Db): Promise<string[]> {
  return db('orders').pluck('title');
}
