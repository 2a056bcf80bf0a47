import { orderNumber } from '../../orders/number';
import type { OrderList, OrderRow } from '../../orders/views';
import { database } from '../db';
import { isStaff, type Person } from '../person';
import { listOrders, type ListedRow, type OrderQuery } from '../tables/order-list';

function rowView(row: ListedRow, staff: boolean): OrderRow {
  const blockers = JSON.parse(row.blocker_ids ?? '[]') as string[];
  const waived = JSON.parse(row.waived_ids ?? '[]') as string[];
  const number = orderNumber(row.id);
  return {
    number,
    title: row.title,
    state: row.state,
    customerName: row.customer_name,
    machineName: staff ? (row.machine_name ?? '') : '',
    stockName: row.stock_name ?? '',
    quantity: row.quantity,
    dueOn: row.due_on,
    updatedAt: row.updated_at,
    blockers: blockers.filter((id) => !waived.includes(id)).length,
    warnings: row.warnings ?? 0,
    pictureUrl: row.picture_sha256 && `/api/orders/${number}/artwork/${row.artwork_version}/picture`,
    scanSeconds: staff ? row.total_seconds : null,
  };
}

/** A page of orders: all of them for staff, their own for customers. */
export async function findOrders(person: Person, query: OrderQuery): Promise<OrderList> {
  const staff = isStaff(person);
  const { rows, total } = await listOrders(database(), query, staff ? null : person.id);
  return { rows: rows.map((row) => rowView(row, staff)), total, page: query.page, perPage: query.perPage };
}
