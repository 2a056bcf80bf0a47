import type { Knex } from 'knex';
import { orderIdOf } from '../../orders/number';
import { ORDER_STATES, type OrderState } from '../../orders/state';
import type { orderQuerySchema } from '../../orders/views';
import type { z } from 'zod';
import type { Db } from '../db';

export type OrderQuery = z.infer<typeof orderQuerySchema>;

export interface ListedRow {
  id: number;
  title: string;
  state: OrderState;
  customer_name: string;
  machine_name: string | null;
  stock_name: string | null;
  quantity: number;
  due_on: string | null;
  updated_at: string;
  artwork_version: number | null;
  blocker_ids: string | null;
  waived_ids: string | null;
  warnings: number | null;
  picture_sha256: string | null;
  total_seconds: number | null;
}

const escaped = (words: string): string => `%${words.replace(/[\\%_]/g, '\\$&')}%`;

function filtered(db: Db, query: OrderQuery, customerId: number | null): Knex.QueryBuilder {
  const rows = db('orders as o').join('people as c', 'c.id', 'o.customer_id');
  if (customerId !== null) rows.where('o.customer_id', customerId);
  const states = query.state
    .split(',')
    .filter((word): word is OrderState => (ORDER_STATES as readonly string[]).includes(word));
  if (states.length > 0) rows.whereIn('o.state', states);
  if (query.machineId !== undefined) rows.where('o.machine_id', query.machineId);
  if (query.q !== '') {
    const id = orderIdOf(query.q.toUpperCase()) ?? orderIdOf(`U-${query.q}`);
    rows.where((any) => {
      any
        .whereRaw(`o.title like ? escape '\\'`, [escaped(query.q)])
        .orWhereRaw(`c.name like ? escape '\\'`, [escaped(query.q)]);
      if (id !== null) any.orWhere('o.id', id);
    });
  }
  return rows;
}

const SORTED: Record<OrderQuery['sort'], string> = {
  due: 'o.due_on',
  updated: 'o.updated_at',
  number: 'o.id',
  customer: 'c.name collate nocase',
  state: `case o.state ${ORDER_STATES.map((state, place) => `when '${state}' then ${place}`).join(' ')} end`,
};

/** Newest finished preparation of the newest artwork: what the list tells of scanning time. */
const SECONDS = `(select p.total_seconds from preparations p where p.order_id = o.id and p.finished_at is not null order by p.id desc limit 1)`;
const WAIVED = `(select json_group_array(w.finding_id) from waivers w where w.order_id = o.id and w.artwork_version = a.version)`;

/** One page of orders; those without a due date come last whichever way the list runs. */
export async function listOrders(
  db: Db,
  query: OrderQuery,
  customerId: number | null,
): Promise<{ rows: ListedRow[]; total: number }> {
  const counted = await filtered(db, query, customerId).count<{ count: number }[]>({ count: '*' });
  const way = query.order === 'down' ? 'desc' : 'asc';
  const rows: ListedRow[] = await filtered(db, query, customerId)
    .leftJoin('machines as m', 'm.id', 'o.machine_id')
    .leftJoin('stocks as s', 's.id', 'o.stock_id')
    .joinRaw(
      'left join artworks a on a.order_id = o.id and a.version = (select max(version) from artworks where order_id = o.id)',
    )
    .select(
      'o.id',
      'o.title',
      'o.state',
      'o.quantity',
      'o.due_on',
      'o.updated_at',
      'a.blocker_ids',
      'a.warnings',
      'a.picture_sha256',
    )
    .select({
      customer_name: 'c.name',
      machine_name: 'm.name',
      stock_name: 's.name',
      artwork_version: 'a.version',
    })
    .select(db.raw(`${SECONDS} as total_seconds`), db.raw(`${WAIVED} as waived_ids`))
    .orderByRaw(
      query.sort === 'due' ? `o.due_on is null, ${SORTED.due} ${way}` : `${SORTED[query.sort]} ${way}`,
    )
    .orderBy('o.id', way)
    .limit(query.perPage)
    .offset((query.page - 1) * query.perPage);
  return { rows, total: counted[0].count };
}
