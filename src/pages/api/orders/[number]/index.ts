import { endpoint } from '@/lib/server/http/endpoint';
import { changeOrderFields } from '@/lib/server/usecases/change-order';
import { readOrder } from '@/lib/server/usecases/read-order';

export const GET = endpoint('GET /api/orders/:number', async ({ person, params }) => ({
  order: await readOrder(person, params.number),
}));

export const PATCH = endpoint('PATCH /api/orders/:number', async ({ person, params, body }) => ({
  order: await changeOrderFields(person, params.number, body.version, body.fields),
}));
