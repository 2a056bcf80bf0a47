import { endpoint } from '@/lib/server/http/endpoint';
import { prepareOrder } from '@/lib/server/usecases/prepare-order';

export const POST = endpoint('POST /api/orders/:number/preparations', ({ person, params, body }) =>
  prepareOrder(person, params.number, body.version),
);
