import { endpoint } from '../../../lib/server/http/endpoint';
import { changeStock } from '../../../lib/server/usecases/keep-stock';

export const PATCH = endpoint('PATCH /api/stocks/:id', async ({ person, params, body }) => ({
  stock: await changeStock(person, params.id, body),
}));
