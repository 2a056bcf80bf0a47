import { orderQuerySchema } from '@/lib/orders/views';
import type { z } from 'zod';

/** What a list shows: search, filter, order and page. All of it stands in the address, so that it can be sent and gone back to. */
export type ListQuery = z.infer<typeof orderQuerySchema>;

const DEFAULTS: ListQuery = orderQuerySchema.parse({});

/** The list that an address asks for; what it asks wrongly falls back to the list's own value, field by field. */
export function readListAddress(search: string, own: Partial<ListQuery> = {}): ListQuery {
  const given = new URLSearchParams(search);
  const base: ListQuery = { ...DEFAULTS, ...own };
  const fields = orderQuerySchema.shape;
  const read = <K extends keyof ListQuery>(name: K): ListQuery[K] => {
    const raw = given.get(name);
    if (raw === null) return base[name];
    const parsed = fields[name].safeParse(raw);
    return parsed.success ? (parsed.data as ListQuery[K]) : base[name];
  };
  return {
    q: read('q'),
    state: read('state'),
    machineId: read('machineId'),
    sort: read('sort'),
    order: read('order'),
    page: read('page'),
    perPage: read('perPage'),
  };
}

/** The address of a list, without what the list would show anyway. Empty, or starting with a question mark. */
export function writeListAddress(query: ListQuery, own: Partial<ListQuery> = {}): string {
  const base: ListQuery = { ...DEFAULTS, ...own };
  const names = Object.keys(query) as (keyof ListQuery)[];
  const kept = names.filter((name) => query[name] !== undefined && query[name] !== base[name]);
  const text = new URLSearchParams(kept.map((name) => [name, String(query[name])])).toString();
  return text ? `?${text}` : '';
}

/** The list after a change; anything but a turned page starts again on the first. */
export function changedList(query: ListQuery, change: Partial<ListQuery>): ListQuery {
  return { ...query, page: 1, ...change };
}

/** The list sorted by a column: the same column again turns the order round. */
export function sortedBy(query: ListQuery, sort: ListQuery['sort']): ListQuery {
  const turned = query.sort === sort && query.order === 'up';
  return changedList(query, { sort, order: turned ? 'down' : 'up' });
}
