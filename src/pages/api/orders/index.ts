import { endpoint } from '@/lib/server/http/endpoint';
import { findOrders } from '@/lib/server/usecases/list-orders';
import { openOrder } from '@/lib/server/usecases/open-order';

export const GET = endpoint('GET /api/orders', ({ person, query }) => findOrders(person, query));

export const POST = endpoint('POST /api/orders', async ({ person, body: { customerId, ...patch } }) => ({
  order: await openOrder(person, patch, customerId),
}));
